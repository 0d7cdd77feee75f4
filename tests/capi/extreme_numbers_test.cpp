// The ends of the range of a double, together: right, or said why not, in every mode of the host's processor.
#include "inquiry.h"

#include <gtest/gtest.h>

#include <cctype>
#include <cmath>
#include <limits>
#include <string>
#include <utility>
#include <vector>

#if defined(__SSE2__)
#include <xmmintrin.h>
#endif

namespace rks_test {
namespace {

constexpr double tiny = 4.9e-324; // the smallest double there is
const std::vector<std::string> texts = {"sentence", "methods", "notes", "check", "estimate",
                                        "lower",    "upper",   "p",     "z"};

void expect_no_text_of_an_infinite_number(const Inquiry& inquiry) {
    for (const std::string& answer : texts)
        for (const char* word : {"inf", "nan"}) {
            const std::string text = inquiry.text(answer);
            for (std::size_t at = text.find(word); at != std::string::npos; at = text.find(word, at + 1)) {
                const bool within = (at > 0 && std::isalpha(static_cast<unsigned char>(text[at - 1])) != 0) ||
                                    std::isalpha(static_cast<unsigned char>(text[at + 3])) != 0;
                EXPECT_TRUE(within) << answer << ": " << text;
            }
        }
}

TEST(ExtremeNumbers, the_smallest_doubles_among_ordinary_ones) {
    const auto inquiry = single({tiny, 2 * tiny, 1, 2, 3, -1, 0.5, 4}, 0);
    EXPECT_EQ(inquiry.number("zeros"), 0);
    // Sizes ascending: tiny, 2 tiny, 0.5, then 1 and -1 tied at 4.5, 2, 3, 4.
    EXPECT_EQ(inquiry.number("statistic"), 36 - 4.5);
    EXPECT_EQ(inquiry.number("estimate"), 1);
    EXPECT_EQ(inquiry.number("lower quartile first"), 7 * tiny / 4);
    const auto two = groups({tiny, 3 * tiny}, {2 * tiny, -tiny}, {{"level", "0.6"}});
    EXPECT_EQ(two.number("statistic"), 3);
    EXPECT_EQ(two.number("estimate"), 1.5 * tiny) << "of -tiny, tiny, 2 tiny and 4 tiny";
    EXPECT_EQ(two.number("upper"), 4 * tiny);
}

// Differences of 2e308 and more are beyond a double; ranks and p are not.
TEST(ExtremeNumbers, differences_beyond_the_largest_double) {
    const auto inquiry =
        groups({1e308, 1.2e308, 1.3e308, 1.5e308, 1.1e308}, {-1e308, -1.2e308, -1.3e308, -1.05e308, -1.5e308});
    EXPECT_NEAR(inquiry.number("p"), 2.0 / 252, 1e-15) << "2 / C(10, 5)";
    EXPECT_EQ(inquiry.number("chance"), 1);
    for (const char* answer : {"estimate", "lower", "upper"}) {
        EXPECT_EQ(inquiry.status(answer), RKS_NO_ANSWER) << answer;
        EXPECT_NE(inquiry.text(answer).find("too large"), std::string::npos) << inquiry.text(answer);
    }
    EXPECT_NE(inquiry.text("sentence").find("beyond 1.79769e+308"), std::string::npos) << inquiry.text("sentence");
    EXPECT_NE(inquiry.text("check").find("without an estimate"), std::string::npos) << inquiry.text("check");
    expect_no_text_of_an_infinite_number(inquiry);
}

TEST(ExtremeNumbers, changes_on_both_sides_of_the_largest_double) {
    const auto inquiry = pairs({-1e308, -1.2e308, -1.3e308, -1.05e308, -1.5e308, -1.6e308, 1},
                               {1e308, 1.2e308, 1.3e308, 1.5e308, 1.1e308, 1.6e308, 2});
    EXPECT_EQ(inquiry.number("p"), 2.0 / 128);
    EXPECT_EQ(inquiry.number("statistic"), 28);
    EXPECT_EQ(inquiry.number("lower"), 1.2e308) << "a Walsh average: (3.2e308 + 1 - 8e307) / 2";
    EXPECT_EQ(inquiry.status("upper"), RKS_NO_ANSWER);
    expect_no_text_of_an_infinite_number(inquiry);
}

TEST(ExtremeNumbers, falls_beyond_the_largest_double_keep_their_sign) {
    const auto inquiry = groups({-1e308, -1.5e308, -1.2e308}, {1e308, 1.1e308, 1.7e308}, {{"level", "0.9"}});
    EXPECT_EQ(inquiry.status("estimate"), RKS_NO_ANSWER);
    EXPECT_NE(inquiry.text("sentence")
                  .find("beyond \xE2\x88\x92"
                        "1.79769e+308"),
              std::string::npos)
        << inquiry.text("sentence");
    expect_no_text_of_an_infinite_number(inquiry);
}

// Walsh averages never leave the range of the values.
TEST(ExtremeNumbers, both_ends_of_the_range_at_once) {
    const auto inquiry = single({1.797e308, -1.797e308, tiny, 1, 1.797e308, 1.797e308}, 0, {{"level", "0.9"}});
    EXPECT_EQ(inquiry.number("statistic"), 1 + 2 + 3 * 4.5);
    EXPECT_EQ(inquiry.status("estimate"), RKS_OK);
    EXPECT_EQ(inquiry.status("lower"), RKS_OK);
    EXPECT_EQ(inquiry.number("upper"), 1.797e308);
    expect_no_text_of_an_infinite_number(inquiry);
}

// At 15 digits the largest double is a little more than itself.
TEST(ExtremeNumbers, the_largest_double_is_ranked_but_cannot_be_written) {
    constexpr double largest = std::numeric_limits<double>::max();
    const auto inquiry = single({largest, largest, largest, 1, 2, 3}, 0);
    EXPECT_EQ(inquiry.number("p"), 2.0 / 64);
    EXPECT_EQ(inquiry.status("upper"), RKS_NO_ANSWER);
    EXPECT_EQ(inquiry.number("lower"), 1);
    expect_no_text_of_an_infinite_number(inquiry);
}

// Three thousand values over 630 decimal places: integers of two thousand bits.
TEST(ExtremeNumbers, thousands_of_values_from_one_end_of_the_range_to_the_other) {
    std::vector<double> first, second;
    for (int i = 0; i < 3000; ++i) {
        first.push_back((i % 2 == 1 ? 1e308 : 1e-320) * ((i * 7919 % 1000 - 500) / 1000.0));
        second.push_back((i % 3 == 1 ? 1e300 : 1e-310) * ((i * 7919 % 997 - 500) / 1000.0));
    }
    for (const auto& inquiry : {groups(first, second), pairs(first, second), single(first, 0)}) {
        EXPECT_TRUE(inquiry.number("p") > 0 && inquiry.number("p") <= 1);
        EXPECT_LE(inquiry.number("lower"), inquiry.number("estimate"));
        EXPECT_GE(inquiry.number("upper"), inquiry.number("estimate"));
        expect_no_text_of_an_infinite_number(inquiry);
    }
}

// More of them would take minutes.
TEST(ExtremeNumbers, too_many_values_over_too_wide_a_range_are_refused) {
    std::vector<double> values(200'000, 1.5);
    values.push_back(1e300);
    Inquiry inquiry("single");
    inquiry.numbers("values", values);
    inquiry.numbers("reference", {1e-300});
    EXPECT_EQ(inquiry.run(), RKS_TOO_LARGE);
    EXPECT_NE(inquiry.text("check").find("601 digits"), std::string::npos) << inquiry.text("check");
    values.pop_back();
    inquiry.numbers("values", values);
    inquiry.numbers("reference", {1.5});
    EXPECT_EQ(inquiry.run(), RKS_OK);
}

#if defined(__SSE2__)
// A host may have set its processor to take denormals for zeros and to flush them, and rounding and traps besides.
class HostMode {
public:
    explicit HostMode(unsigned bits) : before_(_mm_getcsr()) { _mm_setcsr(before_ | bits); }
    ~HostMode() { _mm_setcsr(before_); }
    HostMode(const HostMode&) = delete;
    HostMode& operator=(const HostMode&) = delete;

private:
    unsigned before_;
};

constexpr unsigned flush_to_zero = 0x8000, denormals_are_zeros = 0x0040, round_up = 0x4000;

struct Answers {
    double p = 0, estimate = 0, lower = 0, upper = 0, quartile = 0;
    std::string sentence;
    bool operator==(const Answers&) const = default;
};

Answers answers_of(const Inquiry& inquiry) {
    return {inquiry.number("p"),
            inquiry.number("estimate"),
            inquiry.number("lower"),
            inquiry.number("upper"),
            inquiry.number("lower quartile first"),
            inquiry.text("sentence")};
}

// Prepared while the processor still tells denormals from zero, or the test itself would flush them.
std::vector<Inquiry> questions_about_denormals() {
    std::vector<double> x, y;
    for (int i = 1; i <= 12; ++i) {
        x.push_back(i * 7 % 13 * 1e-320);
        y.push_back(i * 5 % 13 * 1e-321);
    }
    std::vector<Inquiry> questions;
    questions.emplace_back("single").numbers("values", x);
    questions.back().numbers("reference", {0});
    questions.emplace_back("pairs").numbers("before", x);
    questions.back().numbers("after", y);
    questions.emplace_back("groups").numbers("first", x);
    questions.back().numbers("second", y);
    return questions;
}

std::vector<Answers> answered(std::vector<Inquiry> questions) {
    std::vector<Answers> answers;
    for (Inquiry& question : questions) {
        EXPECT_EQ(question.run(), RKS_OK);
        answers.push_back(answers_of(question));
    }
    return answers;
}

TEST(ExtremeNumbers, denormals_give_the_same_in_every_mode_of_the_host) {
    const auto expected = answered(questions_about_denormals());
    EXPECT_GT(expected[0].estimate, 0);
    constexpr unsigned controls = 0xFFC0;
    for (const unsigned bits : {flush_to_zero, denormals_are_zeros, flush_to_zero | denormals_are_zeros | round_up}) {
        auto questions = questions_about_denormals();
        std::vector<Answers> found;
        unsigned set = 0, left = 0;
        {
            const HostMode mode(bits);
            set = _mm_getcsr() & controls;
            found = answered(std::move(questions));
            left = _mm_getcsr() & controls;
        }
        EXPECT_TRUE(found == expected) << bits;
        EXPECT_EQ(set, left) << "the host's mode is put back";
    }
}
#endif

} // namespace
} // namespace rks_test
