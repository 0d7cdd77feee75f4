// Answers, asked by a text or by a cell. The numbers are counted by hand: n values that all lie on one side give
// p = 2 / 2^n, two groups that do not overlap give p = 2 / C(m + n, m).
#include "calc_test.h"

#include <rankstead.h>

namespace calc_tests {
namespace {

class CalcAnswers : public CalcTest {
protected:
    CalcAnswers() {
        put_eight_rises(document);
        put_three_below_three(document);
    }
};

TEST_F(CalcAnswers, PairsAreComparedRowByRow) {
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"p\")"), 2.0 / 256);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"estimate\")"), 4.5);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"n\")"), 8);
}

// Under a change of 2 to 2.5 the ranks below sum to 4, P(T <= 4) = 7/256 is above 2.5 %; under one of 1.5 to 2 they sum
// to 2, P(T <= 2) = 3/256. So 2 is the lower limit, 7 by symmetry the upper, and 2 x 3/256 is left outside.
TEST_F(CalcAnswers, LimitsAndTheirConfidence) {
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"lower\")"), 2);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"upper\")"), 7);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"confidence\")"), 1 - 6.0 / 256);
}

TEST_F(CalcAnswers, GroupsAreCompared) {
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.GROUPS(D1:D3;E1:E3;\"p\")"), 0.1);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.GROUPS(D1:D3;E1:E3;\"estimate\")"), -3);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.GROUPS(D1:D3;E1:E3;\"chance\")"), 0);
}

TEST_F(CalcAnswers, ValuesAreComparedWithAReference) {
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.SINGLE(B1:B6;20;\"p\")"), 2.0 / 64);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.SINGLE(B1:B6;A1;\"p\")"), 2.0 / 64);
}

TEST_F(CalcAnswers, LeftOutItIsTheSentence) {
    const std::string sentence = document.text_of("=RKS.PAIRS(A1:A8;B1:B8;\"sentence\")");
    EXPECT_FALSE(sentence.empty());
    EXPECT_EQ(document.text_of("=RKS.PAIRS(A1:A8;B1:B8)"), sentence);
    EXPECT_EQ(document.text_of("=RKS.PAIRS(A1:A8;B1:B8;;\"side=two-sided\")"), sentence);
    EXPECT_EQ(document.text_of("=RKS.PAIRS(A1:A8;B1:B8;\"\")"), sentence);
    EXPECT_EQ(document.text_of("=RKS.PAIRS(A1:A8;B1:B8;H1:H1)"), sentence) << "a blank cell as a range";
}

TEST_F(CalcAnswers, TheWordMayComeFromALabel) {
    document.put_down("G1", {std::string("Estimate (days):"), std::string("P VALUE"), std::string(" lower: ")});
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;G1)"), 4.5);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;$G$2)"), 2.0 / 256);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;G3:G3)"), 2);
}

TEST_F(CalcAnswers, WhatIsBlankOnPurposeIsAnEmptyText) {
    EXPECT_EQ(document.text_of("=RKS.PAIRS(A1:A8;B1:B8;\"z\")"), "") << "the law was exact, nothing was approximated";
}

TEST_F(CalcAnswers, ANumberThatDoesNotExistIsNotAvailable) {
    EXPECT_TRUE(shows_error(document.result_of("=RKS.GROUPS(D1:D3;E1:E3;\"lower\")"), CellError::not_available))
        << "3 against 3 reach no more than 90 % confidence";
    EXPECT_DOUBLE_EQ(document.number_of("=IFNA(RKS.GROUPS(D1:D3;E1:E3;\"lower\");-1)"), -1);
}

TEST_F(CalcAnswers, RowsBlocksAndInlineArraysAreRead) {
    document.put_rows("A20:D21", {{21.0, 22.0, 23.0, 24.0}, {25.0, 26.0, blank, blank}});
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.SINGLE(A20:D21;20;\"p\")"), 2.0 / 64);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.GROUPS({1;2;3};{4;5;6};\"p\")"), 0.1);
}

TEST_F(CalcAnswers, NumbersAreNumbersToOtherFormulas) {
    EXPECT_EQ(document.text_of("=IF(RKS.PAIRS(A1:A8;B1:B8;\"p\")<0.05;\"changed\";\"not shown\")"), "changed");
    EXPECT_DOUBLE_EQ(document.number_of("=ROUND(100*RKS.PAIRS(A1:A8;B1:B8;\"p\");1)"), 0.8);
}

TEST_F(CalcAnswers, TextsMatchInOtherFormulas) {
    EXPECT_DOUBLE_EQ(document.number_of("=IF(RKS.PAIRS(A1:A8;B1:B8;\"check\")=\"ok\";1;0)"), 1);
}

TEST_F(CalcAnswers, BuildIsThatOfTheLibrary) {
    EXPECT_EQ(document.text_of("=RKS.BUILD()"), rks_build());
}

} // namespace
} // namespace calc_tests
