// What is stored in users' files, and what comes back, also in a country with a decimal comma.
#include "calc_test.h"

namespace calc_tests {
namespace {

constexpr char ods[] = "calc8";
constexpr char xlsx[] = "Calc MS Excel 2007 XML";

class CalcFiles : public CalcTest {
protected:
    CalcFiles() {
        put_eight_rises(document);
        document.put_down("A9", {0.5});
        document.put_down("B9", {9.75});
        document.formula("D1", "=RKS.PAIRS(A1:A9;B1:B9;\"p\")");
        document.formula("D2", "=RKS.PAIRS(A1:A9;B1:B9;\"estimate\";\"level=0.9\")");
        document.formula("D3", "=RKS.PAIRS(A1:A9;B1:B9)");
        document.formula("D4", "=RKS.GROUPS(A1:A9;B1:B9;\"chance\")");
        document.formula("D5", "=RKS.SINGLE(B1:B9;20;\"lower\")");
        document.formula("D6", "=RKS.BUILD()");
        document.formula("D7", "=RKS.PAIRS(A1:A9;B1:B9;\"estimat\")");
    }

    void expect_same_cells(Document& other) {
        for (int row = 1; row <= 7; ++row) {
            const std::string cell = "D" + std::to_string(row);
            EXPECT_EQ(in_words(other.shown(cell)), in_words(document.shown(cell))) << cell;
            EXPECT_EQ(other.formula_of(cell), document.formula_of(cell)) << cell;
        }
    }

    std::filesystem::path saved(const std::string& name, const std::string& filter) {
        document.save(office->folder() / name, filter);
        return office->folder() / name;
    }
};

TEST_F(CalcFiles, OpenDocumentStoresTheNamesThatAreShown) {
    const std::string content = office->part_of_zip(saved("names.ods", ods), "content.xml");
    EXPECT_TRUE(has(content, "\"of:=RKS.PAIRS([.A1:.A9];[.B1:.B9];&quot;p&quot;)\""));
    EXPECT_TRUE(has(content, "\"of:=RKS.GROUPS("));
    EXPECT_TRUE(has(content, "\"of:=RKS.SINGLE("));
    EXPECT_TRUE(has(content, "\"of:=RKS.BUILD()\""));
}

TEST_F(CalcFiles, ExcelFilesStoreTheNamesThatAreShown) {
    const std::filesystem::path file = saved("names.xlsx", xlsx);
    const std::string sheet = office->part_of_zip(file, "xl/worksheets/sheet1.xml");
    EXPECT_TRUE(has(sheet, ">RKS.PAIRS(A1:A9,B1:B9,&quot;p&quot;)</f>"));
    EXPECT_TRUE(has(sheet, ">RKS.GROUPS("));
    EXPECT_TRUE(has(sheet, ">RKS.SINGLE("));
    EXPECT_TRUE(has(sheet, ">RKS.BUILD()</f>"));
    EXPECT_FALSE(has(office->part_of_zip(file, "xl/workbook.xml"), "RKS")) << "a stray defined name";
}

TEST_F(CalcFiles, OpenDocumentComesBack) {
    Document loaded = office->load(saved("back.ods", ods));
    expect_same_cells(loaded);
    loaded.recalculate_everything();
    expect_same_cells(loaded);
}

TEST_F(CalcFiles, ExcelFilesComeBack) {
    Document loaded = office->load(saved("back.xlsx", xlsx));
    loaded.recalculate_everything();
    expect_same_cells(loaded);
}

TEST_F(CalcFiles, HardRecalculationFollowsTheData) {
    Document loaded = office->load(saved("changed.ods", ods));
    loaded.put("B9", -9.75);
    loaded.recalculate_everything();
    EXPECT_GT(loaded.number("D1"), document.number("D1"));
}

TEST_F(CalcFiles, ADecimalCommaChangesNoNumber) {
    const std::filesystem::path open_document = saved("comma.ods", ods);
    const std::filesystem::path excel = saved("comma.xlsx", xlsx);
    Office german("de-DE");
    for (const std::filesystem::path& file : {open_document, excel}) {
        Document loaded = german.load(file);
        loaded.recalculate_everything();
        loaded.formula("F1", "=0.5");
        EXPECT_EQ(loaded.as_displayed("F1"), "0,5") << "or this tests nothing";
        expect_same_cells(loaded);
        EXPECT_DOUBLE_EQ(loaded.number_of("=RKS.PAIRS(A1:A8;B1:B8;\"lower\";\"level=0.95\")"), 2);
    }
}

} // namespace
} // namespace calc_tests
