#include "random_sums.h"

#include <algorithm>
#include <cmath>
#include <numeric>

namespace rankstead::accuracy {

namespace {

constexpr double smallest_log_p = -295 * 2.302585092994046;
constexpr double usual_deviations = 5;

bool is_taken(Random& random, const Tilt& tilt, std::int64_t score) {
    constexpr double steps = 1 << 16;
    const double odds = tilt.odds(score);
    const double share = std::isinf(odds) ? 1 : odds / (1 + odds);
    return random.whole(1, static_cast<std::int64_t>(steps)) <= static_cast<std::int64_t>(std::round(share * steps));
}

// The sum of an arrangement drawn from the tilted law.
std::int64_t random_sign_sum(Random& random, const Scores& scores, const Tilt& tilt) {
    std::int64_t sum = 0;
    for (const std::int64_t score : scores) {
        sum += is_taken(random, tilt, score) ? score : 0;
    }
    return sum;
}

// Takes or gives up single scores until so many are taken; as likely each as the tilt says, so that the sum stays where
// it is wanted. After many vain attempts the lowest there are.
void correct_count(Random& random, const Scores& scores, std::int64_t chosen, const Tilt& tilt,
                   std::vector<char>& taken) {
    auto missing = chosen - std::accumulate(taken.begin(), taken.end(), std::int64_t{0});
    const auto last = static_cast<std::int64_t>(scores.size()) - 1;
    for (std::int64_t attempt = 0; attempt <= 20 * last && missing != 0; ++attempt) {
        const auto i = static_cast<std::size_t>(random.whole(0, last));
        const char wanted = missing > 0 ? 1 : 0;
        if (taken[i] != wanted && is_taken(random, tilt, scores[i]) == (wanted == 1)) {
            taken[i] = wanted;
            missing += wanted == 1 ? -1 : 1;
        }
    }
    for (auto one = taken.rbegin(); missing < 0; ++one) {
        missing += *one;
        *one = 0;
    }
    for (auto one = taken.begin(); missing > 0; ++one) {
        missing -= 1 - *one;
        *one = 1;
    }
}

std::int64_t random_choice_sum(Random& random, const Scores& scores, std::int64_t chosen, const Tilt& tilt) {
    std::vector<char> taken;
    for (const std::int64_t score : scores) {
        taken.push_back(is_taken(random, tilt, score) ? 1 : 0);
    }
    correct_count(random, scores, chosen, tilt, taken);
    return std::inner_product(scores.begin(), scores.end(), taken.begin(), std::int64_t{0});
}

// The largest log p, from 0 down, that exact counting can reach.
double ceiling_of(const TiltedLaw& law, double floor, const WorkUpTo& work, double most_work) {
    double ceiling = 0;
    constexpr int steps = 40;
    for (int step = 1; step <= steps; ++step) {
        const Tilt tilt = law.reaching(ceiling);
        const auto sum = static_cast<std::int64_t>(tilt.mean) + 1;
        if (work(sum, tilt.log2_arrangements(law.chosen(), sum)) <= most_work) {
            break;
        }
        ceiling = floor * step / steps;
    }
    return ceiling;
}

template <class Draw>
RandomSums random_sums(Random& random, const TiltedLaw& law, double mean, int wanted, const WorkUpTo& work,
                       double most_work, Draw draw) {
    const double floor = std::max(smallest_log_p, -law.log2_total() * std::log(2.0));
    const double ceiling = ceiling_of(law, floor, work, most_work);
    RandomSums result;
    std::vector<Tilt> tilts;
    for (int i = 0; i < wanted; ++i) {
        const double deviations = usual_deviations * fraction(random);
        const double log_p = i % 2 == 0 ? floor + (ceiling - floor) * fraction(random) : -deviations * deviations / 2;
        tilts.push_back(law.reaching(std::clamp(log_p, floor, ceiling)));
        const std::int64_t sum = draw(tilts.back());
        if (static_cast<double>(sum) <= mean) {
            result.sums.push_back(sum);
        }
    }
    if (!result.sums.empty()) {
        const std::int64_t largest = *std::max_element(result.sums.begin(), result.sums.end());
        result.bits = law.log2_total() + 1;
        for (const Tilt& tilt : tilts) {
            result.bits = std::min(result.bits, tilt.log2_arrangements(law.chosen(), largest));
        }
    }
    return result;
}

} // namespace

RandomSums random_sign_sums(Random& random, const Scores& scores, int wanted, const WorkUpTo& work, double most_work) {
    const std::int64_t all = std::accumulate(scores.begin(), scores.end(), std::int64_t{0});
    return random_sums(random, TiltedLaw(scores, std::nullopt), static_cast<double>(all) / 2, wanted, work, most_work,
                       [&](const Tilt& tilt) {
                           const std::int64_t sum = random_sign_sum(random, scores, tilt);
                           return std::min(sum, all - sum); // the law is symmetric
                       });
}

RandomSums random_choice_sums(Random& random, const Scores& scores, std::int64_t chosen, int wanted,
                              const WorkUpTo& work, double most_work) {
    const std::int64_t all = std::accumulate(scores.begin(), scores.end(), std::int64_t{0});
    const double mean = static_cast<double>(chosen * all) / static_cast<double>(scores.size());
    return random_sums(random, TiltedLaw(scores, chosen), mean, wanted, work, most_work,
                       [&](const Tilt& tilt) { return random_choice_sum(random, scores, chosen, tilt); });
}

} // namespace rankstead::accuracy
