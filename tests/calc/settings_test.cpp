// Settings, given as a text or kept on a sheet.
#include "calc_test.h"

namespace calc_tests {
namespace {

class CalcSettings : public CalcTest {
protected:
    CalcSettings() {
        put_eight_rises(document);
        put_three_below_three(document);
        document.add_sheet("Settings");
    }

    void keep(const std::vector<std::vector<Content>>& rows) {
        document.put_rows("Settings.A1:B" + std::to_string(rows.size()), rows);
    }
};

TEST_F(CalcSettings, OneText) {
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"p\";\"side=higher\")"), 1.0 / 256);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"p\";\"side=higher; test=sign\")"), 1.0 / 256);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.GROUPS(D1:D3;E1:E3;\"upper\";\"level=0.9\")"), -1)
        << "2 of 20 arrangements are exactly one tenth, so 0.9 is just attained";
}

TEST_F(CalcSettings, OneTextInACell) {
    document.put("G1", std::string("side=lower"));
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"p\";G1)"), 1);
}

TEST_F(CalcSettings, TwoColumnsOnAnotherSheet) {
    keep({{std::string("side"), std::string("higher")}, {std::string("level"), 0.9}});
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"p\";$Settings.$A$1:$B$2)"), 1.0 / 256);
    document.put("Settings.B1", std::string("two-sided"));
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"p\";$Settings.$A$1:$B$2)"), 2.0 / 256);
}

TEST_F(CalcSettings, AChangeOnTheSheetReachesEveryCell) {
    keep({{std::string("side"), std::string("higher")}});
    document.formula("H1", "=RKS.PAIRS(A1:A8;B1:B8;\"p\";$Settings.$A$1:$B$1)");
    EXPECT_DOUBLE_EQ(document.number("H1"), 1.0 / 256);
    document.put("Settings.B1", std::string("two-sided"));
    EXPECT_DOUBLE_EQ(document.number("H1"), 2.0 / 256);
}

TEST_F(CalcSettings, OneSheetServesEveryStudy) {
    keep({{std::string("chance interval"), std::string("newcombe")}, {std::string("zeros"), std::string("pratt")}});
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"p\";$Settings.$A$1:$B$2)"), 2.0 / 256);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.GROUPS(D1:D3;E1:E3;\"p\";$Settings.$A$1:$B$2)"), 0.1);
}

TEST_F(CalcSettings, BlankRowsAndBlankCellsChangeNothing) {
    keep({{std::string("side"), std::string("higher")}, {blank, blank}, {std::string("level"), blank}, {blank, blank}});
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"p\";$Settings.$A$1:$B$9)"), 1.0 / 256);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"p\";$Settings.$A$20:$B$29)"), 2.0 / 256);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"p\";H1)"), 2.0 / 256);
    EXPECT_DOUBLE_EQ(document.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"p\";\"\")"), 2.0 / 256);
}

TEST_F(CalcSettings, AnUnknownNameIsSaid) {
    EXPECT_TRUE(
        shows_error(document.result_of("=RKS.PAIRS(A1:A8;B1:B8;\"p\";\"syde=higher\")"), CellError::invalid_argument));
    const std::string why = document.text_of("=RKS.PAIRS(A1:A8;B1:B8;\"sentence\";\"syde=higher\")");
    EXPECT_TRUE(starts_with(why, "Not computed: "));
    EXPECT_TRUE(has(why, "syde"));
    EXPECT_TRUE(has(document.text_of("=RKS.PAIRS(A1:A8;B1:B8;\"check\";\"syde=higher\")"), "syde"));
}

TEST_F(CalcSettings, AnUnknownValueIsSaidWithTheValidOnes) {
    keep({{std::string("side"), std::string("upwards")}});
    EXPECT_TRUE(shows_error(document.result_of("=RKS.PAIRS(A1:A8;B1:B8;\"p\";$Settings.$A$1:$B$1)"),
                            CellError::invalid_argument));
    const std::string why = document.text_of("=RKS.PAIRS(A1:A8;B1:B8;\"notes\";$Settings.$A$1:$B$1)");
    EXPECT_TRUE(starts_with(why, "Not computed: "));
    EXPECT_TRUE(has(why, "upwards"));
    EXPECT_TRUE(has(why, "two-sided, higher, lower"));
}

TEST_F(CalcSettings, ANumberIsNotASetting) {
    EXPECT_TRUE(shows_error(document.result_of("=RKS.PAIRS(A1:A8;B1:B8;\"p\";0.95)"), CellError::invalid_argument));
}

} // namespace
} // namespace calc_tests
