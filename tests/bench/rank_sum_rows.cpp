#include "law_rows.h"
#include "sampled_data.h"

#include "laws/exact_laws.h"

#include <cmath>
#include <memory>

namespace rankstead::bench {

namespace {

constexpr double untied_goal = 25e-6;
constexpr double any_shape_goal = 40e-3;
constexpr std::int64_t most_written_down = 10'000; // scores of a law without ties, for its reference

std::string sizes(const std::string& first, const std::string& second) {
    return ", " + first + " v " + second;
}

std::string sizes(std::int64_t first, std::int64_t second) {
    return sizes(std::to_string(first), std::to_string(second));
}

std::int64_t usual_u(std::int64_t first, std::int64_t second) {
    const auto m = static_cast<double>(first);
    const auto n = static_cast<double>(second);
    const double deviation = std::sqrt(m * n * (m + n + 1) / 12);
    return static_cast<std::int64_t>(m * n / 2 - usual_deviations * deviation);
}

LawRow untied(const std::string& what, std::int64_t first, std::int64_t second, std::int64_t u) {
    LawRow row{what, untied_goal, [=] { return UntiedRankSumLaw(first, second).at(u); }, {}};
    if (first + second <= most_written_down) {
        row.exact = exact_tails(untied_choice_scores(first, second, u));
    }
    return row;
}

LawRow untied(std::int64_t first, std::int64_t second) {
    return untied("rank sum p, no ties" + sizes(first, second), first, second, usual_u(first, second));
}

LawRow untied(std::int64_t first, std::int64_t second, const std::string& first_words,
              const std::string& second_words) {
    return untied("rank sum p, no ties" + sizes(first_words, second_words), first, second, usual_u(first, second));
}

LawRow far_tail(std::int64_t first, std::int64_t second, std::int64_t u) {
    return untied("rank sum p, no ties" + sizes(first, second) + ", U = " + std::to_string(u), first, second, u);
}

LawRow tied(const TwoSamples& samples, const std::string& what, double goal) {
    const auto ranking = std::make_shared<const PooledRanking>(samples.ranking());
    return {what, goal, [ranking] { return exact_rank_sum_tails(choice_scores(*ranking), seconds_for_p); },
            exact_tails(choice_scores(*ranking))};
}

LawRow tied(std::int64_t first, std::int64_t second, std::int64_t levels, double goal) {
    const TwoSamples samples = two_samples(first, second, levels);
    return tied(samples, "rank sum p, " + std::to_string(levels) + " levels" + sizes(first, second), goal);
}

} // namespace

std::vector<LawRow> rank_sum_rows() {
    constexpr std::int64_t million = 1'000'000;
    constexpr std::int64_t milliard = 1'000'000'000;
    std::vector<LawRow> rows;
    for (const std::int64_t a_side : {10, 25, 50, 100, 1000}) {
        rows.push_back(untied(a_side, a_side));
    }
    rows.push_back(untied(100'000, 100'000, "1e5", "1e5"));
    rows.push_back(untied(million, million, "1e6", "1e6"));
    rows.push_back(untied(milliard, milliard, "1e9", "1e9"));
    rows.push_back(untied(50, million, "50", "1e6"));
    rows.push_back(far_tail(100, 100, 500));
    rows.push_back(far_tail(1000, 1000, 76'000));
    struct Balanced {
        std::int64_t a_side;
        double goal;
    };
    for (const Balanced& size :
         {Balanced{50, 0.4e-3}, Balanced{100, 3e-3}, Balanced{1000, 8e-3}, Balanced{50'000, 300e-3}}) {
        rows.push_back(tied(size.a_side, size.a_side, 13, size.goal));
        rows.push_back(tied(size.a_side, size.a_side, 2 * size.a_side / 3, size.goal));
    }
    rows.push_back(tied(50, 1000, 5, any_shape_goal));
    rows.push_back(tied(50, 1000, 13, any_shape_goal));
    rows.push_back(tied(50, 1000, 350, any_shape_goal));
    rows.push_back(tied(10, 1000, 13, any_shape_goal));
    rows.push_back(tied(10, 1000, 336, any_shape_goal));
    rows.push_back(tied(5, 500, 13, any_shape_goal));
    rows.push_back(tied(5, 500, 168, any_shape_goal));
    rows.push_back(tied(500, 500, 13, any_shape_goal));
    rows.push_back(tied(500, 500, 333, any_shape_goal));
    return rows;
}

} // namespace rankstead::bench
