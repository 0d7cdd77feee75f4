#include "scored_items.h"

#include <numeric>

namespace rankstead {

std::int64_t ScoredItems::size() const {
    return std::accumulate(counts.begin(), counts.end(), std::int64_t{0});
}

std::int64_t ScoredItems::sum() const {
    return std::inner_product(scores.begin(), scores.end(), counts.begin(), std::int64_t{0});
}

ScoredItems ScoredItems::of(const std::vector<std::int64_t>& sorted) {
    ScoredItems items;
    for (const std::int64_t score : sorted) {
        if (items.scores.empty() || items.scores.back() != score) {
            items.scores.push_back(score);
            items.counts.push_back(0);
        }
        ++items.counts.back();
    }
    return items;
}

} // namespace rankstead
