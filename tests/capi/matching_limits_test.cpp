// The limits of interval=matching never contradict p: they are the outermost margins that the very exact test of p does
// not reject.
#include "trial.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>
#include <set>
#include <sstream>

namespace rks_test {
namespace {

/// 1 - level as a decimal, with room for the last bits: p values are fractions whose distance from it is far larger.
bool exceeds(double p, double alpha) {
    return p > alpha * (1 + 1e-11);
}

// Every margin at which an ordering changes, in fortieths.
std::set<std::int64_t> breakpoints(const Trial& trial, bool is_sign) {
    std::set<std::int64_t> points;
    for (std::size_t i = 0; i < trial.one.size(); ++i)
        for (std::size_t j = 0; j < trial.other.size(); ++j) {
            const auto difference = [&](std::size_t k) { return trial.other[k] - trial.one[k]; };
            if (trial.study == "groups")
                points.insert(4 * (trial.one[i] - trial.other[j]));
            else if (!is_sign || i == j)
                points.insert(2 * (difference(i) + difference(j)));
        }
    return points;
}

// The breakpoints, the middles between them, and one margin beyond either end.
std::vector<std::int64_t> margins_to_try(const std::set<std::int64_t>& points) {
    std::vector<std::int64_t> margins(points.begin(), points.end());
    for (std::size_t i = 0, gaps = margins.size(); i + 1 < gaps; ++i)
        margins.push_back((margins[i] + margins[i + 1]) / 2);
    margins.push_back(*points.begin() - 40);
    margins.push_back(*points.rbegin() + 40);
    return margins;
}

struct Bounds {
    double lower = -HUGE_VAL, upper = HUGE_VAL; // in fortieths

    bool outside(std::int64_t margin) const {
        const auto m = static_cast<double>(margin);
        return m < lower || m > upper;
    }
    bool inside(std::int64_t margin) const {
        const auto m = static_cast<double>(margin);
        return m > lower && m < upper;
    }
};

Bounds bounds_of(const Inquiry& inquiry) {
    Bounds bounds;
    if (inquiry.status("lower") == RKS_OK)
        bounds.lower = std::round(40 * inquiry.number("lower"));
    if (inquiry.status("upper") == RKS_OK)
        bounds.upper = std::round(40 * inquiry.number("upper"));
    return bounds;
}

bool is_one_of_the_differences(const Trial& trial, std::int64_t margin) {
    for (std::size_t i = 0; i < trial.one.size(); ++i)
        if (4 * (trial.other[i] - trial.one[i]) == margin)
            return true;
    return false;
}

// A margin written as briefly as it can be.
std::string brief(std::int64_t margin) {
    std::string number = decimal_text(margin, 40);
    number.erase(number.find_last_not_of('0') + 1);
    if (number.back() == '.')
        number.pop_back();
    return number;
}

// Whether the notes say that p and the limits disagree at this margin: it is one of the numbers listed there.
bool notes_name(const Inquiry& inquiry, std::int64_t margin) {
    const std::string before = "p and the limits disagree at exactly ", after = ", because",
                      notes = inquiry.text("notes");
    const auto start = notes.find(before);
    if (start == std::string::npos)
        return false;
    const auto end = notes.find(after, start);
    std::istringstream list(notes.substr(start + before.size(), end - start - before.size()));
    for (std::string number; list >> number;) {
        if (number.back() == ',')
            number.pop_back();
        if (number == brief(margin))
            return true;
    }
    return false;
}

// Returns 1 if the margin contradicts the limits but is excused and named in the notes.
int check_margin(const Trial& trial, const Inquiry& plain, const Bounds& bounds, std::int64_t margin) {
    const double p = trial.ask(decimal_text(margin, 40)).number("p");
    EXPECT_TRUE(p > 0 && p <= 1) << p;
    const bool rejected = !exceeds(p, trial.alpha);
    if (!(bounds.outside(margin) && !rejected) && !(bounds.inside(margin) && rejected))
        return 0;
    EXPECT_TRUE(trial.drops_zeros && is_one_of_the_differences(trial, margin))
        << "margin " << decimal_text(margin, 40) << " has p " << p;
    EXPECT_TRUE(notes_name(plain, margin)) << decimal_text(margin, 40) << " is not in: " << plain.text("notes");
    return 1;
}

int check_all_margins(const Trial& trial, bool is_sign) {
    SCOPED_TRACE(describe(trial));
    const auto plain = trial.ask("0");
    const auto bounds = bounds_of(plain);
    int excused = 0;
    for (const auto margin : margins_to_try(breakpoints(trial, is_sign)))
        excused += check_margin(trial, plain, bounds, margin);
    return excused;
}

TEST(MatchingLimits, limits_of_groups_never_contradict_p) {
    RandomData random(11);
    for (int round = 0; round < 150; ++round)
        EXPECT_EQ(check_all_margins(random_trial(random, "groups"), false), 0);
}

TEST(MatchingLimits, limits_of_pairs_with_ranked_zeros_never_contradict_p) {
    RandomData random(12);
    for (int round = 0; round < 120; ++round) {
        auto trial = random_trial(random, "pairs");
        trial.settings.emplace_back("zeros", "pratt");
        EXPECT_EQ(check_all_margins(trial, false), 0);
    }
}

TEST(MatchingLimits, limits_of_the_sign_test_never_contradict_p) {
    RandomData random(13);
    for (int round = 0; round < 250; ++round) {
        auto trial = random_trial(random, "pairs");
        trial.settings.emplace_back("test", "sign");
        EXPECT_EQ(check_all_margins(trial, true), 0);
    }
}

// With zeros dropped, a margin equal to one of the differences may contradict the limits: the notes list it.
TEST(MatchingLimits, limits_of_pairs_with_dropped_zeros_contradict_p_only_where_the_notes_say) {
    RandomData random(14);
    for (int round = 0; round < 250; ++round) {
        auto trial = random_trial(random, "pairs");
        trial.drops_zeros = true;
        check_all_margins(trial, false);
    }
}

// Found by search in whole-number arithmetic: p at margin 3 is 0.109375, outside 0 to 2.5, and p at margin 4 is
// 0.0859375, inside 0.5 to 4.5.
TEST(MatchingLimits, the_notes_list_margins_that_contradict_the_limits_because_their_zeros_are_dropped) {
    const std::vector<std::pair<Tenths, std::string>> found = {{{60, 20, 20, 10, 30, -10, 10, 10, -20}, "3"},
                                                               {{10, 10, 60, 50, 40, 0, -20, 50, 10}, "4"}};
    for (const auto& [changes, margin] : found) {
        Trial trial{"pairs", Tenths(changes.size(), 0), changes, {{"level", "0.9"}}, 0.1, true};
        EXPECT_EQ(check_all_margins(trial, false), 1);
        const auto notes = trial.ask("0").text("notes");
        EXPECT_NE(notes.find("exactly " + margin), std::string::npos) << notes;
        EXPECT_NE(notes.find("zeros=pratt"), std::string::npos) << "what to do: " << notes;
    }
}

void expect_equal_limits(const Inquiry& matching, const Inquiry& table) {
    for (const char* answer : {"lower", "upper"}) {
        EXPECT_EQ(matching.status(answer), table.status(answer)) << answer;
        if (table.status(answer) == RKS_OK) {
            EXPECT_EQ(matching.number(answer), table.number(answer)) << answer;
        }
    }
    if (table.status("lower") == RKS_OK || table.status("upper") == RKS_OK) {
        EXPECT_NEAR(matching.number("confidence"), table.number("confidence"), 1e-14);
    }
}

TEST(MatchingLimits, without_ties_matching_limits_are_the_table_limits) {
    RandomData random(15);
    for (int round = 0; round < 150; ++round) {
        const auto m = static_cast<std::size_t>(random.between(1, 12)),
                   n = static_cast<std::size_t>(random.between(1, 12));
        const auto pooled = doubles(random.untied(m + n));
        const std::vector<double> first(pooled.begin(), pooled.begin() + static_cast<std::ptrdiff_t>(m));
        const std::vector<double> second(pooled.begin() + static_cast<std::ptrdiff_t>(m), pooled.end());
        const std::string level = random.one_of<std::string>({"0.95", "0.9", "0.5", "0.99"});
        const std::string side = random.one_of(sides);
        const auto with = [&](const char* interval) {
            return Settings{{"level", level}, {"side", side}, {"interval", interval}, {"method", "exact"}};
        };
        expect_equal_limits(groups(first, second, with("matching")), groups(first, second, with("table")));
        expect_equal_limits(single(first, 0, with("matching")), single(first, 0, with("table")));
    }
}

} // namespace
} // namespace rks_test
