// Data as wards really keep them: blanks, headings, words, errors, too few, too long.
#include "calc_test.h"

namespace calc_tests {
namespace {

class CalcData : public CalcTest {
protected:
    CalcData() { put_eight_rises(document); }
};

TEST_F(CalcData, BlanksAreNeverZeros) {
    document.put("B3", blank);
    document.put("A6", blank);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"n\")"), 6);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"p\")"), 2.0 / 64);
}

TEST_F(CalcData, AFormulaThatGivesAnEmptyTextIsABlank) {
    document.formula("B3", "=\"\"");
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"n\")"), 7);
}

TEST_F(CalcData, APairWithoutItsLastValueStaysInItsRow) {
    document.put("B8", blank);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"n\")"), 7);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"p\")"), 2.0 / 128);
}

TEST_F(CalcData, AHeadingIsNotAValue) {
    document.put_down("F1", {std::string("Old ward"), 1.0, 2.0, 3.0});
    document.put_down("G1", {std::string("Neue Wäsche"), 4.0, 5.0, 6.0});
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.GROUPS(F1:F4;G1:G4;\"p\")"), 0.1);
    EXPECT_TRUE(has(document.text_of("=RKS.GROUPS(F1:F4;G1:G4)"), "Neue Wäsche"));
}

TEST_F(CalcData, ATextIsAnErrorThatNamesItsPosition) {
    document.put("B5", std::string("see notes"));
    EXPECT_TRUE(shows_error(document.result_of("=RKS.PAIRS(A1:A8;B1:B8;\"p\")"), CellError::no_value));
    const std::string why = document.text_of("=RKS.PAIRS(A1:A8;B1:B8;\"check\")");
    EXPECT_TRUE(has(why, "after"));
    EXPECT_TRUE(has(why, "5"));
    EXPECT_TRUE(has(why, "see notes"));
    EXPECT_TRUE(starts_with(document.text_of("=RKS.PAIRS(A1:A8;B1:B8)"), "Not computed: "));
}

TEST_F(CalcData, ADeclaredMissingWordIsMissing) {
    document.put("B5", std::string("n/a"));
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"n\";\"missing=n/a\")"), 7);
}

TEST_F(CalcData, AnErrorCellIsAnError) {
    document.formula("B5", "=1/0");
    EXPECT_TRUE(shows_error(document.result_of("=RKS.PAIRS(A1:A8;B1:B8;\"p\")"), CellError::parameter_list));
    EXPECT_TRUE(shows_error(document.result_of("=RKS.PAIRS(A1:A8;B1:B8;\"check\")"), CellError::parameter_list));
}

TEST_F(CalcData, AnErrorInsideAnArrayIsNeverRanked) {
    document.array_formula("H1:H1", "=RKS.SINGLE(SQRT(B1:B8-24);0;\"p\")");
    EXPECT_TRUE(std::holds_alternative<CellError>(document.shown("H1"))) << in_words(document.shown("H1"));
}

TEST_F(CalcData, UnequalLengthsAreRefused) {
    EXPECT_TRUE(shows_error(document.result_of("=RKS.PAIRS(A1:A7;B1:B8;\"p\")"), CellError::no_value));
    const std::string why = document.text_of("=RKS.PAIRS(A1:A7;B1:B8;\"check\")");
    EXPECT_TRUE(has(why, "7"));
    EXPECT_TRUE(has(why, "8"));
}

TEST_F(CalcData, OnePair) {
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1;B1;\"p\")"), 1);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(20;21;\"estimate\")"), 1);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A1;B1:B1;\"n\")"), 1);
}

TEST_F(CalcData, NothingButBlanks) {
    EXPECT_TRUE(shows_error(document.result_of("=RKS.PAIRS(H1:H9;I1:I9;\"p\")"), CellError::no_value));
    EXPECT_TRUE(starts_with(document.text_of("=RKS.PAIRS(H1:H9;I1:I9)"), "Not computed: "));
    EXPECT_TRUE(starts_with(document.text_of("=RKS.PAIRS(H:H;I:I)"), "Not computed: "));
}

TEST_F(CalcData, WholeColumnsGiveTheSame) {
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A:A;B:B;\"p\")"), 2.0 / 256);
    EXPECT_EQ(document.text_of("=RKS.PAIRS(A:A;B:B;\"stamp\")"), document.text_of("=RKS.PAIRS(A1:A8;B1:B8;\"stamp\")"));
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A:A;B1:B8;\"n\")"), 8) << "no row is filled beyond the 8th";
}

TEST_F(CalcData, DecimalsAreDecimals) {
    document.put_down("F1", {0.1, 0.7, 0.0});
    document.put_down("G1", {0.3, 0.9, 0.5});
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(F1:F3;G1:G3;\"tied\")"), 2) << "0.3-0.1 ties with 0.9-0.7";
}

} // namespace
} // namespace calc_tests
