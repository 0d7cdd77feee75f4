// Degenerate samples. The row numbers are those of a list of inputs that other programs answered wrongly; expected
// values come from whole-number arithmetic, measured wrong answers (SciPy issue numbers) stand beside them.
#include "inquiry.h"

#include <gtest/gtest.h>

#include <cmath>

namespace rks_test {
namespace {

std::vector<double> repeated(double value, std::size_t times) {
    return std::vector<double>(times, value);
}

std::vector<double> run_of(double start, std::size_t count) {
    std::vector<double> values;
    for (std::size_t i = 0; i < count; ++i)
        values.push_back(start + static_cast<double>(i));
    return values;
}

std::vector<double> joined(std::vector<double> one, const std::vector<double>& other) {
    one.insert(one.end(), other.begin(), other.end());
    return one;
}

void expect_no_change(const Inquiry& inquiry, double estimate) {
    EXPECT_EQ(inquiry.number("p"), 1);
    EXPECT_EQ(inquiry.number("statistic"), 0);
    EXPECT_EQ(inquiry.number("estimate"), estimate);
    EXPECT_EQ(inquiry.number("zeros"), 5);
    EXPECT_EQ(inquiry.status("z"), RKS_BLANK);
    EXPECT_NE(inquiry.text("sentence"), "");
    EXPECT_NE(inquiry.text("notes"), "") << "that no pair changed";
}

// #6805: p = .043 with ranked zeros.
TEST(DegenerateSamples, A1_all_differences_zero) {
    for (const char* test : {"signed rank", "sign"})
        for (const char* zeros : {"drop", "pratt"})
            for (const char* method : {"auto", "exact", "approximate"}) {
                SCOPED_TRACE(std::string(test) + ' ' + zeros + ' ' + method);
                const Settings settings = {{"test", test}, {"zeros", zeros}, {"method", method}};
                expect_no_change(pairs(run_of(1, 5), run_of(1, 5), settings), 0);
                expect_no_change(single(repeated(4, 5), 4, settings), 4); // the centre itself
            }
}

TEST(DegenerateSamples, A2_all_observations_tied) {
    for (const char* method : {"auto", "exact", "approximate"}) {
        const auto inquiry = groups(repeated(3, 6), repeated(3, 7), {{"method", method}});
        EXPECT_EQ(inquiry.number("p"), 1) << method;
        EXPECT_EQ(inquiry.status("z"), RKS_BLANK) << method << ": z is 0/0";
        EXPECT_EQ(inquiry.number("chance"), 0.5);
        EXPECT_EQ(inquiry.number("estimate"), 0);
        EXPECT_EQ(inquiry.number("smallest p"), 1);
    }
}

TEST(DegenerateSamples, A4_one_pair) {
    const auto inquiry = pairs({3}, {5});
    EXPECT_EQ(inquiry.number("p"), 1);
    EXPECT_EQ(inquiry.number("smallest p"), 1);
    EXPECT_EQ(inquiry.number("estimate"), 2);
    for (const char* limit : {"lower", "upper"})
        EXPECT_EQ(inquiry.status(limit), RKS_NO_ANSWER);
}

TEST(DegenerateSamples, A5_five_pairs_and_three_against_three) {
    const auto five = single(run_of(1, 5), 0);
    EXPECT_EQ(five.number("p"), 0.0625);
    EXPECT_EQ(five.number("smallest p"), 0.0625);
    const auto three = groups(run_of(1, 3), run_of(11, 3));
    EXPECT_DOUBLE_EQ(three.number("p"), 0.1);
    EXPECT_DOUBLE_EQ(three.number("smallest p"), 0.1);
    for (const auto* inquiry : {&five, &three})
        EXPECT_NE(inquiry->text("notes"), "") << "that p below 0.05 cannot be reached";
}

// #6897: p = 0.
TEST(DegenerateSamples, A6_one_group_empty) {
    Inquiry inquiry("groups");
    inquiry.numbers("first", {1, 2, 3});
    inquiry.cells("second", {});
    EXPECT_EQ(inquiry.run(), RKS_NO_DATA);
    EXPECT_EQ(inquiry.status("p"), RKS_NO_DATA);
    EXPECT_NE(inquiry.text("check").find("second"), std::string::npos) << inquiry.text("check");
}

TEST(DegenerateSamples, A7_one_group_of_one_value) {
    const auto inquiry = groups({10}, run_of(1, 7));
    EXPECT_DOUBLE_EQ(inquiry.number("p"), 2.0 / 8);
    EXPECT_DOUBLE_EQ(inquiry.number("smallest p"), 2.0 / 8);
    EXPECT_EQ(inquiry.number("chance"), 1);
    for (const char* limit : {"chance lower", "chance upper"}) {
        const auto status = inquiry.status(limit);
        const double value = inquiry.number(limit);
        EXPECT_TRUE(status == RKS_NO_ANSWER || (value >= 0 && value <= 1)) << limit << ' ' << value;
    }
}

TEST(DegenerateSamples, A9_limits_that_cannot_be_reached_name_the_largest_level) {
    for (const char* interval : {"matching", "table"}) {
        const auto five = single(run_of(1, 5), 0, {{"interval", interval}});
        EXPECT_EQ(five.status("lower"), RKS_NO_ANSWER);
        EXPECT_EQ(five.status("upper"), RKS_NO_ANSWER);
        EXPECT_NE(five.text("check").find("93.75"), std::string::npos) << five.text("check");
        EXPECT_NE(five.text("notes").find("93.75"), std::string::npos) << five.text("notes");
        const auto reached = single(run_of(1, 5), 0, {{"interval", interval}, {"level", "0.9375"}});
        EXPECT_EQ(reached.number("lower"), 1);
        EXPECT_EQ(reached.number("upper"), 5);
        EXPECT_EQ(reached.number("confidence"), 0.9375);
    }
}

// #15843: NaN in a related test. A standard error of 0 must not collapse the limits.
TEST(DegenerateSamples, A10_complete_separation) {
    for (const char* interval : {"placement", "newcombe"}) {
        const auto inquiry = groups(run_of(21, 8), run_of(1, 9), {{"chance interval", interval}});
        EXPECT_NEAR(inquiry.number("p"), 2.0 / 24310, 1e-15) << "2 / C(17, 8)";
        EXPECT_EQ(inquiry.number("chance"), 1);
        EXPECT_GT(inquiry.number("chance lower"), 0.5);
        EXPECT_LT(inquiry.number("chance lower"), 0.999);
        EXPECT_LE(inquiry.number("chance upper"), 1);
        EXPECT_GT(inquiry.number("chance upper"), inquiry.number("chance lower"));
    }
}

// PR #12223: p = 1.03.
TEST(DegenerateSamples, A11_statistic_at_the_centre) {
    const auto inquiry = single({-1, -2, 3, 4, -5, 6, 7, 8, -9, -10, 11, -12}, 0);
    EXPECT_EQ(inquiry.number("statistic"), 39);
    EXPECT_EQ(inquiry.number("p"), 1);
}

// #10223: p = .0154 from the mean of a sample without zeros.
TEST(DegenerateSamples, A12_balanced_changes_among_many_zeros) {
    const auto d = joined(joined(repeated(1, 15), repeated(0, 40)), repeated(-1, 15));
    for (const char* method : {"auto", "exact", "approximate"}) {
        const auto inquiry = single(d, 0, {{"zeros", "pratt"}, {"method", method}});
        EXPECT_EQ(inquiry.number("statistic"), 832.5) << method;
        EXPECT_EQ(inquiry.number("p"), 1) << method;
        EXPECT_NE(inquiry.text("notes"), "") << "many zeros have their note";
    }
}

// Found by random cases: at a chance of 4/9 and a tail of one half a general root finder gave up.
TEST(DegenerateSamples, four_rises_of_nine_at_the_lowest_level) {
    for (const char* side : {"higher", "lower"}) {
        const auto inquiry = single({1, 1, 1, 1, -1, -1, -1, -1, -1}, 0, {{"level", "0.5"}, {"side", side}});
        const double chance = inquiry.number("chance");
        EXPECT_DOUBLE_EQ(chance, 4.0 / 9);
        for (const char* limit : {"chance lower", "chance upper"})
            EXPECT_TRUE(inquiry.status(limit) == RKS_OK || inquiry.status(limit) == RKS_NO_ANSWER) << limit;
    }
}

} // namespace
} // namespace rks_test
