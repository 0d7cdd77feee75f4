// Blocks as a reporting workbook has them: labels with one formula filled down, a header row of words with one formula
// filled right and down, and the whole report as an array.
#include "calc_test.h"

namespace calc_tests {
namespace {

class CalcReport : public CalcTest {
protected:
    CalcReport() { put_eight_rises(document); }
};

TEST_F(CalcReport, OneFormulaFilledDownBesideLabels) {
    document.put_down("D1", {std::string("P value"), std::string("Estimate (minutes):"), std::string("Lower:"),
                             std::string("Upper:"), std::string("n"), std::string("Check")});
    document.formula("E1", "=RKS.PAIRS($A$1:$A$8;$B$1:$B$8;D1)");
    document.fill_down("E1:E6");
    EXPECT_DOUBLE_EQ(document.number("E1"), 2.0 / 256);
    EXPECT_DOUBLE_EQ(document.number("E2"), 4.5);
    EXPECT_DOUBLE_EQ(document.number("E3"), 2);
    EXPECT_DOUBLE_EQ(document.number("E4"), 7);
    EXPECT_DOUBLE_EQ(document.number("E5"), 8);
    EXPECT_EQ(document.text("E6"), "ok");
}

// One row for each ward, its values in columns J to L before and M to O after.
TEST_F(CalcReport, OneFormulaFilledRightAndDown) {
    document.put_rows(
        "J2:O4", {{1.0, 2.0, 3.0, 2.0, 4.0, 6.0}, {5.0, 5.0, 5.0, 4.0, 3.0, 2.0}, {7.0, 8.0, blank, 8.0, 10.0, 9.0}});
    document.put_rows("D1:F1", {{std::string("estimate"), std::string("p"), std::string("n")}});
    document.formula("D2", "=RKS.PAIRS($J2:$L2;$M2:$O2;D$1)");
    document.fill_right("D2:F2");
    document.fill_down("D2:F4");
    const double expected[3][3] = {{2, 0.25, 3}, {-2, 0.25, 3}, {1.5, 0.5, 2}};
    const std::string columns = "DEF";
    for (std::size_t row = 0; row < 3; ++row)
        for (std::size_t column = 0; column < 3; ++column) {
            const std::string cell = columns.substr(column, 1) + std::to_string(row + 2);
            EXPECT_DOUBLE_EQ(document.number(cell), expected[row][column]) << cell;
        }
}

TEST_F(CalcReport, TheWholeReportAsAnArray) {
    document.array_formula("D1:E60", "=RKS.PAIRS(A1:A8;B1:B8;\"report\")");
    int answers = 0;
    for (int row = 1; row <= 60 && document.shown("D" + std::to_string(row)) != Shown(CellError::not_available);
         ++row) {
        const std::string word = document.text("D" + std::to_string(row));
        const Shown alone = document.result_of("=RKS.PAIRS(A1:A8;B1:B8;\"" + word + "\")");
        EXPECT_EQ(document.shown("E" + std::to_string(row)), alone) << word;
        ++answers;
    }
    EXPECT_GT(answers, 10);
}

TEST_F(CalcReport, ANumberThatDoesNotExistIsAnErrorInsideTheReportToo) {
    document.array_formula("D1:E60", "=RKS.PAIRS(A1:A3;B1:B3;\"report\")");
    EXPECT_TRUE(shows_error(document.result_of("=VLOOKUP(\"lower\";D1:E60;2;0)"), CellError::not_available));
    EXPECT_TRUE(shows_error(document.result_of("=RKS.PAIRS(A1:A3;B1:B3;\"lower\")"), CellError::not_available));
}

TEST_F(CalcReport, WithoutDataTheReportSaysWhy) {
    EXPECT_TRUE(starts_with(document.text_of("=RKS.PAIRS(H1:H8;I1:I8;\"report\")"), "Not computed: "));
    EXPECT_TRUE(starts_with(document.text_of("=RKS.PAIRS(A1:A8;B1:B8;\"report\";\"syde=lower\")"), "Not computed: "));
}

} // namespace
} // namespace calc_tests
