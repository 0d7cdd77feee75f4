#include "sought_tail.h"

#include "stirling.h"

#include <algorithm>
#include <cstddef>

namespace rankstead {

namespace {

// Sum of the first `chosen` scores, group by group from iterators on.
template <class Iterator>
double sum_of_first(std::int64_t chosen, std::size_t groups, Iterator score, Iterator count) {
    double sum = 0;
    for (std::size_t g = 0; g < groups && chosen > 0; ++g, ++score, ++count) {
        const std::int64_t of_group = std::min(chosen, *count);
        sum += static_cast<double>(of_group) * static_cast<double>(*score);
        chosen -= of_group;
    }
    return sum;
}

} // namespace

SoughtTail::SoughtTail(const Characteristic& law, Count count, std::int64_t chosen, std::int64_t w)
    : law_(law), fixed_(count == Count::fixed), chosen_(chosen), w_(w), distance_(distance_from_mean()),
      log_count_(fixed_ ? log_count_probability(law.size(), static_cast<double>(chosen)) : 0) {}

double SoughtTail::distance_from_mean() const {
    const std::int64_t sum = law_.items().sum();
    if (!fixed_) {
        return static_cast<double>(2 * static_cast<Wide>(w_) - sum) / 2;
    }
    const std::int64_t n = law_.items().size();
    return static_cast<double>(static_cast<Wide>(w_) * n - static_cast<Wide>(chosen_) * sum) / static_cast<double>(n);
}

double SoughtTail::variance() const {
    if (!fixed_) {
        return law_.sum_of_squares() / 4;
    }
    const double n = law_.size();
    return law_.p() * (1 - law_.p()) * law_.sum_of_squares() * n / (n - 1);
}

double SoughtTail::lowest() const {
    const ScoredItems& items = law_.items();
    const double sum =
        fixed_ ? sum_of_first(chosen_, items.scores.size(), items.scores.begin(), items.counts.begin()) : 0;
    return sum - static_cast<double>(w_);
}

double SoughtTail::highest() const {
    const ScoredItems& items = law_.items();
    if (!fixed_) {
        return static_cast<double>(items.sum() - w_);
    }
    return sum_of_first(chosen_, items.scores.size(), items.scores.rbegin(), items.counts.rbegin()) -
           static_cast<double>(w_);
}

} // namespace rankstead
