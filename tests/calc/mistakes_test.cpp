// Formulas as they are typed wrongly: an error or a reason, never a wrong number, and the office goes on.
#include "calc_test.h"

namespace calc_tests {
namespace {

class CalcMistakes : public CalcTest {
protected:
    CalcMistakes() { put_eight_rises(document); }
    ~CalcMistakes() override { EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"p\")"), 2.0 / 256); }
};

TEST_F(CalcMistakes, NoArguments) {
    EXPECT_TRUE(starts_with(document.text_of("=RKS.PAIRS()"), "Not computed: "));
    EXPECT_TRUE(starts_with(document.text_of("=RKS.SINGLE()"), "Not computed: "));
    EXPECT_TRUE(starts_with(document.text_of("=RKS.GROUPS()"), "Not computed: "));
}

TEST_F(CalcMistakes, OneArgumentOnly) {
    const std::string why = document.text_of("=RKS.PAIRS(A1:A8)");
    EXPECT_TRUE(starts_with(why, "Not computed: "));
    EXPECT_TRUE(has(why, "after"));
    EXPECT_TRUE(shows_error(document.result_of("=RKS.PAIRS(A1:A8;;\"p\")"), CellError::no_value));
    EXPECT_TRUE(has(document.text_of("=RKS.PAIRS(;B1:B8)"), "before"));
}

TEST_F(CalcMistakes, TheAnswerInPlaceOfData) {
    EXPECT_TRUE(shows_error(document.result_of("=RKS.PAIRS(\"p\";A1:A8;B1:B8)"), CellError::invalid_argument));
    EXPECT_TRUE(starts_with(document.text_of("=RKS.PAIRS(A1:A8;\"p\")"), "Not computed: "));
}

TEST_F(CalcMistakes, SettingsInPlaceOfTheAnswer) {
    EXPECT_TRUE(
        shows_error(document.result_of("=RKS.PAIRS(A1:A8;B1:B8;\"side=higher\")"), CellError::invalid_argument));
    EXPECT_TRUE(
        shows_error(document.result_of("=RKS.PAIRS(A1:A8;B1:B8;\"side=higher\";\"p\")"), CellError::invalid_argument));
}

TEST_F(CalcMistakes, AMisspeltAnswer) {
    EXPECT_TRUE(shows_error(document.result_of("=RKS.PAIRS(A1:A8;B1:B8;\"estimat\")"), CellError::invalid_argument));
    EXPECT_TRUE(shows_error(document.result_of("=RKS.PAIRS(A1:A8;B1:B8;\"n first\")"), CellError::invalid_argument))
        << "an answer of another study";
}

TEST_F(CalcMistakes, ANumberOrManyCellsAsAnswer) {
    EXPECT_TRUE(shows_error(document.result_of("=RKS.PAIRS(A1:A8;B1:B8;0.05)"), CellError::invalid_argument));
    EXPECT_TRUE(shows_error(document.result_of("=RKS.PAIRS(A1:A8;B1:B8;A1:A8)"), CellError::invalid_argument));
    document.put_down("H1", {std::string("p"), std::string("n")});
    EXPECT_TRUE(shows_error(document.result_of("=RKS.PAIRS(A1:A8;B1:B8;H1:H2)"), CellError::invalid_argument));
}

TEST_F(CalcMistakes, TooManyArguments) {
    EXPECT_TRUE(shows_error(document.result_of("=RKS.PAIRS(A1:A8;B1:B8;\"p\";\"\";1)"), CellError::parameter_list));
    EXPECT_TRUE(shows_error(document.result_of("=RKS.BUILD(1)"), CellError::parameter_list));
}

TEST_F(CalcMistakes, ADifferenceWithoutArrayEntryIsAnErrorOfCalc) {
    EXPECT_TRUE(shows_error(document.result_of("=RKS.SINGLE(B1:B8-A1:A8;0;\"p\")"), CellError::no_value));
    document.array_formula("H1:H1", "=RKS.SINGLE(B1:B8-A1:A8;0;\"p\")");
    EXPECT_DOUBLE_EQ(document.number("H1"), 2.0 / 256);
}

TEST_F(CalcMistakes, TextsThatAreHardToRead) {
    document.put("B5", std::string("\xf0\x9f\x92\x8a <5 µg/l \xe2\x80\xae"));
    EXPECT_TRUE(has(document.text_of("=RKS.PAIRS(A1:A8;B1:B8;\"check\")"), "<5 µg/l"));
    document.put("B5", std::string(20000, 'x'));
    EXPECT_TRUE(starts_with(document.text_of("=RKS.PAIRS(A1:A8;B1:B8)"), "Not computed: "));
    EXPECT_TRUE(
        shows_error(document.result_of("=RKS.PAIRS(A1:A4;B1:B4;REPT(\"p\";30000))"), CellError::invalid_argument));
    document.put("B5", 25.0);
}

} // namespace
} // namespace calc_tests
