#include "law_rows.h"
#include "sampled_data.h"

#include "laws/exact_laws.h"

#include <memory>

namespace rankstead::bench {

namespace {

LawRow row(const std::string& what, double goal, const std::vector<std::int64_t>& changes, bool zeros_ranked) {
    const auto ranking = std::make_shared<const SignedRanking>(rank_signed(changes, std::int64_t{0}, zeros_ranked));
    return {what, goal, [ranking] { return exact_signed_rank_tails(sign_scores(*ranking), seconds_for_p); },
            exact_tails(sign_scores(*ranking))};
}

} // namespace

std::vector<LawRow> signed_rank_rows() {
    std::vector<LawRow> rows;
    for (const std::int64_t n : {10, 25, 50}) {
        const std::string size = ", n = " + std::to_string(n);
        rows.push_back(row("signed rank p, no ties" + size, 7e-6, changes(n, all_distinct), false));
        rows.push_back(row("signed rank p, ties" + size, 7e-6, changes(n, n / 3), false));
    }
    struct Large {
        std::int64_t n;
        const char* words;
        double goal;
    };
    for (const Large& large : {Large{1000, "1e3", 1e-3}, Large{10'000, "1e4", 6e-3}, Large{100'000, "1e5", 60e-3}}) {
        const std::string size = std::string(", n = ") + large.words;
        rows.push_back(row("signed rank p, no ties" + size, large.goal, changes(large.n, all_distinct), false));
        rows.push_back(row("signed rank p, 12 levels, a tenth zeros" + size, large.goal,
                           changes(large.n, 12, large.n / 10), true));
        rows.push_back(row("signed rank p, n/3 levels, a tenth zeros" + size, large.goal,
                           changes(large.n, large.n / 3, large.n / 10), true));
    }
    return rows;
}

} // namespace rankstead::bench
