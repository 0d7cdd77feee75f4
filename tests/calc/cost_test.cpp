// A reporting workbook of 2,000 cells over 200 small tables. How long it takes is printed, and never a failure.
#include "calc_test.h"

#include <chrono>
#include <iostream>
#include <random>

namespace calc_tests {
namespace {

constexpr int tables = 200;
constexpr int pairs = 18;
const std::vector<std::string> words = {"p",     "estimate", "lower", "upper",    "n",
                                        "zeros", "method",   "notes", "sentence", "check"};

class CalcCost : public CalcTest {
protected:
    // Each table has its 18 pairs in one row: columns L to AC before, AD to AU after.
    void put_tables(unsigned seed) {
        std::mt19937 random(seed);
        std::vector<std::vector<Content>> rows;
        for (int table = 0; table < tables; ++table) {
            std::vector<Content> row;
            for (int i = 0; i < 2 * pairs; ++i)
                row.emplace_back(static_cast<double>(random() % 40));
            rows.push_back(row);
        }
        document.put_rows("L2:AU201", rows);
    }

    double milliseconds_of_recalculation() {
        const auto start = std::chrono::steady_clock::now();
        document.recalculate_everything();
        return std::chrono::duration<double, std::milli>(std::chrono::steady_clock::now() - start).count();
    }
};

TEST_F(CalcCost, TwoThousandCellsOverTwoHundredTables) {
    put_tables(0);
    document.put_rows("A1:J1", {std::vector<Content>(words.begin(), words.end())});
    document.formula("A2", "=RKS.PAIRS($L2:$AC2;$AD2:$AU2;A$1)");
    document.fill_right("A2:J2");
    document.fill_down("A2:J201");
    std::cout << "2,000 cells over 200 tables, hard recalculation, ms:";
    document.calculate_automatically(false);
    for (unsigned seed = 1; seed <= 3; ++seed) { // new data each time, so that no result is known already
        put_tables(seed);
        std::cout << ' ' << milliseconds_of_recalculation();
    }
    std::cout << '\n';
    for (int row = 2; row <= tables + 1; ++row)
        EXPECT_EQ(document.text("J" + std::to_string(row)), "ok");
}

TEST_F(CalcCost, WholeColumns) {
    put_eight_rises(document);
    document.put_rows("D1:F1", {{std::string("p"), std::string("sentence"), std::string("check")}});
    document.formula("D2", "=RKS.PAIRS($A:$A;$B:$B;D$1)");
    document.fill_right("D2:F2");
    std::cout << "3 cells over two whole columns, hard recalculation, ms: " << milliseconds_of_recalculation() << '\n';
    EXPECT_DOUBLE_EQ(document.number("D2"), 2.0 / 256);
    EXPECT_EQ(document.text("F2"), "ok");
}

} // namespace
} // namespace calc_tests
