// A million values a side: an answer or a clear status.
#include "inquiry.h"
#include "random_data.h"

#include <gtest/gtest.h>

#include <chrono>
#include <cmath>
#include <string>

namespace rks_test {
namespace {

void expect_sound(const Inquiry& inquiry) {
    const double p = inquiry.number("p");
    EXPECT_TRUE(p >= 0 && p <= 1) << p;
    EXPECT_GT(p, 0) << "p is never 0";
    EXPECT_EQ(inquiry.status("estimate"), RKS_OK);
    EXPECT_LE(inquiry.number("lower"), inquiry.number("estimate"));
    EXPECT_GE(inquiry.number("upper"), inquiry.number("estimate"));
}

void expect_answer_or_too_large(Inquiry& inquiry) {
    const rks_status status = inquiry.run();
    if (status == RKS_OK) {
        expect_sound(inquiry);
        return;
    }
    EXPECT_TRUE(status == RKS_TOO_LARGE || status == RKS_OUT_OF_MEMORY) << status;
    EXPECT_FALSE(inquiry.text("check").empty());
    EXPECT_EQ(inquiry.text("sentence"), "Not computed: " + inquiry.text("check"));
}

void expect_exact_or_says_approximate(const Inquiry& inquiry) {
    if (inquiry.text("method").starts_with("exact"))
        return;
    EXPECT_NE(inquiry.text("method").find("pproximat"), std::string::npos) << inquiry.text("method");
    EXPECT_NE(inquiry.text("notes").find("pproximat"), std::string::npos) << inquiry.text("notes");
}

TEST(LargeData, a_million_values_in_two_groups) {
    Inquiry inquiry("groups");
    inquiry.numbers("first", random_tenths(1, million, 100000));
    inquiry.numbers("second", random_tenths(2, million, 100000, 3));
    expect_answer_or_too_large(inquiry);
    expect_exact_or_says_approximate(inquiry);
}

TEST(LargeData, a_million_values_on_few_levels) {
    Inquiry inquiry("groups");
    inquiry.numbers("first", random_tenths(1, million, 4));
    inquiry.numbers("second", random_tenths(2, million, 4));
    expect_answer_or_too_large(inquiry);
}

TEST(LargeData, a_million_pairs) {
    for (const char* test : {"signed rank", "sign"}) {
        Inquiry inquiry("pairs");
        inquiry.numbers("before", random_tenths(3, million, 50));
        inquiry.numbers("after", random_tenths(4, million, 50));
        inquiry.set("test", test);
        expect_answer_or_too_large(inquiry);
    }
}

// A whole spreadsheet column: a million blanks and some numbers.
TEST(LargeData, a_whole_column_of_mostly_blanks) {
    std::vector<rks_cell> cells(1048576, blank_cell());
    for (std::size_t i = 0; i < 12; ++i)
        cells[3 * i] = number_cell(static_cast<double>(i) + 0.5);
    Inquiry inquiry("single");
    inquiry.cells("values", cells);
    inquiry.numbers("reference", {0});
    ASSERT_EQ(inquiry.run(), RKS_OK) << inquiry.message();
    EXPECT_EQ(inquiry.number("n"), 12);
    EXPECT_EQ(inquiry.number("p"), std::ldexp(1.0, -11));
}

TEST(LargeData, exact_is_refused_or_replaced_aloud_where_it_would_take_too_long) {
    Inquiry inquiry("groups");
    inquiry.numbers("first", random_tenths(5, 20000, 1000000));
    inquiry.numbers("second", random_tenths(6, 20000, 1000000, 3));
    inquiry.set("method", "exact");
    const auto start = std::chrono::steady_clock::now();
    expect_answer_or_too_large(inquiry);
    const std::chrono::duration<double> taken = std::chrono::steady_clock::now() - start;
    EXPECT_LT(taken.count(), 60) << "the office must not hang";
}

std::vector<double> run_of(double start, std::size_t count) {
    std::vector<double> values;
    for (std::size_t i = 0; i < count; ++i)
        values.push_back(start + static_cast<double>(i));
    return values;
}

// Far beyond the smallest double: the truth is 2 / C(10000, 5000), about 1e-3008.
TEST(LargeData, p_is_never_0) {
    for (const char* method : {"auto", "exact", "approximate"}) {
        EXPECT_GT(groups(run_of(0, 5000), run_of(6000, 5000), {{"method", method}}).number("p"), 0) << method;
        EXPECT_GT(single(run_of(1, 3000), 0, {{"method", method}}).number("p"), 0) << method;
        EXPECT_GT(single(run_of(1, 3000), 0, {{"method", method}, {"test", "sign"}}).number("p"), 0) << method;
    }
}

} // namespace
} // namespace rks_test
