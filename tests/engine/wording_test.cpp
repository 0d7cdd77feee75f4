// wording.h: numbers and findings in words.
#include "wording.h"

#include "data.h"
#include "outcome.h"
#include "version.h"

#include <gtest/gtest.h>

namespace rankstead {
namespace {

const NumberWriter with_point(DecimalSign::point);
const NumberWriter with_comma(DecimalSign::comma);

TEST(WriteP, gives_two_decimals_above_0_01) {
    EXPECT_EQ(with_point.p(0.5), "= 0.50");
    EXPECT_EQ(with_point.p(0.034), "= 0.03");
    EXPECT_EQ(with_point.p(0.011), "= 0.01");
    EXPECT_EQ(with_point.p(1), "= 1.00");
}

TEST(WriteP, gives_three_decimals_from_0_001_to_0_01) {
    EXPECT_EQ(with_point.p(0.01), "= 0.010");
    EXPECT_EQ(with_point.p(0.0042), "= 0.004");
    EXPECT_EQ(with_point.p(0.001), "= 0.001");
}

TEST(WriteP, gives_a_bound_below_0_001) {
    EXPECT_EQ(with_point.p(0.000999), "< 0.001");
    EXPECT_EQ(with_point.p(1e-300), "< 0.001");
}

TEST(WriteP, gives_more_digits_where_rounding_would_cross_0_05) {
    EXPECT_EQ(with_point.p(0.0451), "= 0.045");
    EXPECT_EQ(with_point.p(0.0496), "= 0.0496");
    EXPECT_EQ(with_point.p(0.049996), "= 0.049996");
    EXPECT_EQ(with_point.p(0.0541), "= 0.054");
    EXPECT_EQ(with_point.p(0.0503), "= 0.0503");
    EXPECT_EQ(with_point.p(0.0449), "= 0.04");
    EXPECT_EQ(with_point.p(0.0551), "= 0.06");
}

TEST(WriteP, shows_0_05_itself_as_it_is) {
    EXPECT_EQ(with_point.p(0.05), "= 0.05");
}

TEST(WriteP, uses_the_decimal_sign_asked_for) {
    EXPECT_EQ(with_comma.p(0.034), "= 0,03");
    EXPECT_EQ(with_comma.p(0.0001), "< 0,001");
}

TEST(WriteNumber, gives_up_to_six_significant_digits) {
    EXPECT_EQ(with_point.number(12.5), "12.5");
    EXPECT_EQ(with_point.number(1.0 / 3), "0.333333");
    EXPECT_EQ(with_point.number(-0.00012345678), "−0.000123457");
    EXPECT_EQ(with_point.number(2.50), "2.5");
}

TEST(WriteNumber, keeps_the_whole_part_in_full) {
    EXPECT_EQ(with_point.number(1234567), "1234567");
    EXPECT_EQ(with_point.number(1234567.8), "1234568");
    EXPECT_EQ(with_point.number(100), "100");
}

TEST(WriteNumber, has_no_minus_zero) {
    EXPECT_EQ(with_point.number(-0.0), "0");
}

TEST(WriteNumber, is_scientific_at_the_extremes) {
    EXPECT_EQ(with_point.number(1e300), "1e+300");
    EXPECT_EQ(with_point.number(-2.5e-7), "−2.5e-07");
}

TEST(WriteNumber, uses_the_decimal_sign_asked_for) {
    EXPECT_EQ(with_comma.number(12.5), "12,5");
}

TEST(WriteCount, groups_digits_by_three) {
    EXPECT_EQ(with_point.count(0), "0");
    EXPECT_EQ(with_point.count(999), "999");
    EXPECT_EQ(with_point.count(1024), "1,024");
    EXPECT_EQ(with_point.count(1234567890), "1,234,567,890");
    EXPECT_EQ(with_comma.count(1024), "1.024");
}

TEST(WritePercent, gives_up_to_two_decimals) {
    EXPECT_EQ(with_point.percent(0.95), "95%");
    EXPECT_EQ(with_point.percent(0.9375), "93.75%");
    EXPECT_EQ(with_point.percent(0.9999), "99.99%");
    EXPECT_EQ(with_comma.percent(0.9375), "93,75%");
}

// n = 6, all above: two-sided p = 2/64 = 0.03125; the limits are the extreme Walsh averages (Hollander & Wolfe 1999).
TEST(Sentence, of_pairs) {
    EXPECT_EQ(sentence(test::changes({1, 2, 3, 4, 5, 6})),
              "after against before in 6 pairs: the estimated change, after minus before, is 3.5 (95% confidence "
              "interval 1 to 6); p = 0.03, two-sided exact signed rank test.");
}

TEST(Sentence, of_single) {
    EXPECT_EQ(
        sentence(test::single({11, 12, 13, 14, 15, 16}, 10, "unit=min; first name=Waits")),
        "Waits (n = 6) against the reference 10 min: the estimated centre is 13.5 min (95% confidence interval 11 "
        "to 16); p = 0.03, two-sided exact signed rank test.");
}

// 4 v 4 separated: p = 2/70 = 0.0286; of the differences 1 to 7 the middle is 4, and the limits the extremes.
TEST(Sentence, of_groups) {
    EXPECT_EQ(sentence(test::groups({5, 6, 7, 8}, {1, 2, 3, 4}, "first name=New; second name=Old")),
              "New (n = 4) against Old (n = 4): the estimated shift, New minus Old, is 4 (95% confidence interval 1 to "
              "7); p = 0.03, two-sided exact rank sum test.");
}

// One-sided at 95%, 5 above of 5: the lower limit is the lowest value, since 1/32 <= 0.05 < 6/32 for the next.
TEST(Sentence, one_sided_higher_has_a_lower_limit) {
    EXPECT_EQ(sentence(test::changes({1, 2, 3, 4, 5}, "side=higher; test=sign")),
              "after against before in 5 pairs: the estimated change, after minus before, is 3 (95% confidence limit: "
              "at least 1); p = 0.03, one-sided (higher) exact sign test.");
}

TEST(Sentence, one_sided_lower_has_an_upper_limit) {
    EXPECT_EQ(sentence(test::changes({-1, -2, -3, -4, -5}, "side=lower; test=sign")),
              "after against before in 5 pairs: the estimated change, after minus before, is −3 (95% confidence limit: "
              "at most −1); p = 0.03, one-sided (lower) exact sign test.");
}

TEST(Sentence, says_when_no_interval_exists) {
    const std::string words = sentence(test::groups({3}, {1}));
    EXPECT_NE(words.find("(no 95% confidence interval exists with so few values)"), std::string::npos) << words;
}

TEST(Sentence, names_the_margin) {
    const std::string words = sentence(test::groups({5, 6, 7, 8}, {1, 2, 3, 4}, "margin=-2.5; unit=cm"));
    EXPECT_NE(words.find("rank sum test, against a margin of −2.5 cm."), std::string::npos) << words;
}

TEST(Sentence, says_that_p_is_approximate) {
    const std::string words = sentence(test::groups({5, 6, 7, 8}, {1, 2, 3, 4}, "method=approximate"));
    EXPECT_NE(words.find("two-sided approximate rank sum test."), std::string::npos) << words;
}

TEST(Sentence, of_one_pair_is_in_the_singular) {
    EXPECT_NE(sentence(test::changes({1})).find(" in 1 pair: "), std::string::npos);
}

TEST(Sentence, uses_the_decimal_sign_asked_for) {
    const std::string words = sentence(test::changes({1, 2, 3, 4, 5, 6}, "decimal sign=comma"));
    EXPECT_NE(words.find("is 3,5 (95% confidence interval 1 to 6); p = 0,03,"), std::string::npos) << words;
}

TEST(LawWords, name_how_the_law_was_found) {
    Outcome outcome = test::groups({1, 3}, {2, 4});
    EXPECT_EQ(law_words(outcome), ", by counting arrangements");
    outcome.law = LawKind::summed;
    EXPECT_EQ(law_words(outcome), ", by dynamic programming");
    outcome.law = LawKind::closed;
    EXPECT_EQ(law_words(outcome), ", by inversion of the closed characteristic function");
    outcome.law = LawKind::inverted;
    EXPECT_EQ(law_words(outcome), ", by inversion of the characteristic function");
    outcome.law = LawKind::binomial;
    EXPECT_EQ(law_words(outcome), ", by the binomial law");
    outcome.law = LawKind::normal;
    EXPECT_EQ(law_words(outcome), "");
}

TEST(MethodWords, name_the_saddlepoint_approximation) {
    Outcome outcome = test::groups({1, 3}, {2, 4});
    outcome.exact = false;
    outcome.law = LawKind::saddlepoint;
    EXPECT_EQ(method_words(outcome), "saddlepoint approximation with lattice correction");
}

TEST(MethodWords, of_an_exact_p) {
    EXPECT_EQ(method_words(test::groups({1, 3}, {2, 4})), "exact");
    EXPECT_EQ(method_words(test::groups({1, 3}, {3, 4})), "exact, conditional on the ties");
}

TEST(MethodWords, name_what_became_of_zeros) {
    EXPECT_EQ(method_words(test::changes({0, 1, 2})), "exact, zeros dropped before ranking (Wilcoxon 1945)");
    EXPECT_EQ(method_words(test::changes({0, 1, 2}, "zeros=pratt")),
              "exact, zeros ranked and then set aside (Pratt 1959)");
    EXPECT_EQ(method_words(test::changes({0, 1, 1}, "test=sign")), "exact, zeros set aside");
}

TEST(MethodWords, of_an_approximate_p) {
    EXPECT_EQ(method_words(test::groups({1, 3}, {2, 4}, "method=approximate")),
              "normal approximation, tie-corrected, with continuity correction");
}

TEST(MethodsSentence, names_test_interval_estimate_and_version) {
    EXPECT_EQ(
        methods_sentence(test::groups({1, 3}, {2, 4})),
        "The two groups were compared by the Wilcoxon-Mann-Whitney rank sum test (two-sided; exact); the shift is "
        "the Hodges-Lehmann estimate with a 95% confidence interval found by inverting the same test (Rankstead " +
            std::string(version) + ").");
    EXPECT_EQ(methods_sentence(test::single({1, 3}, 0, "test=sign; side=higher; interval=table; level=0.9")),
              "Values were compared with the reference by the sign test (one-sided; exact); the centre is the median "
              "with a 90% confidence interval of classical order statistics (Rankstead " +
                  std::string(version) + ").");
    EXPECT_NE(methods_sentence(test::changes({1, 3}))
                  .find("Paired measurements were compared by the Wilcoxon signed "
                        "rank test (two-sided; exact); the change is the "
                        "Hodges-Lehmann estimate"),
              std::string::npos);
}

TEST(LedgerWords, account_for_every_cell_of_every_argument) {
    Outcome outcome = test::groups({1, 3}, {2, 4});
    outcome.ledgers[1].seen = 9;
    outcome.ledgers[1].blank = 3;
    outcome.ledgers[1].heading = 1;
    outcome.ledgers[1].missing_words = 2;
    outcome.ledgers[1].unpaired = 1;
    EXPECT_EQ(ledger_words(outcome),
              "first: 2 seen = 2 used + 0 blank + 0 text + 0 censored + 0 unpaired; second: 9 seen = 2 used + 3 blank "
              "+ 3 text + 0 censored + 1 unpaired (text: 1 heading, 2 missing)");
}

TEST(Caution, says_what_the_results_are_not_for) {
    EXPECT_NE(caution_line().find("not for the diagnosis, monitoring or treatment of a person"),
              std::string_view::npos);
    EXPECT_NE(caution().find("A large p is not evidence of no difference."), std::string_view::npos);
}

} // namespace
} // namespace rankstead
