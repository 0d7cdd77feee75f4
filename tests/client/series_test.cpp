#include "series.h"

#include <gtest/gtest.h>

namespace rankstead::client {
namespace {

using Cells = std::vector<std::string>;
using Rows = std::vector<std::size_t>;

Series series(Cells cells) {
    Series result{"first", "first", "old", "old", {}, std::move(cells), {}};
    for (std::size_t i = 0; i < result.cells.size(); ++i) {
        result.rows.push_back(i + 2);
    }
    return result;
}

TEST(BeginWithNumbers, LeavesNumbersAsTheyAre) {
    std::vector<Series> data{series({"1", "x", "2"})};
    begin_with_numbers(data, false, '.');
    EXPECT_EQ(data[0].cells, (Cells{"1", "x", "2"}));
}

TEST(BeginWithNumbers, LeavesABlankFirstCell) {
    std::vector<Series> data{series({"", "1", "2"})};
    begin_with_numbers(data, false, '.');
    EXPECT_EQ(data[0].cells, (Cells{"", "1", "2"}));
}

TEST(BeginWithNumbers, MovesATextBehindTheNumbers) {
    std::vector<Series> data{series({"lost", "3 to 4", "-1.5", "2"}), series({"1", "2", "3", "4"})};
    begin_with_numbers(data, false, '.');
    EXPECT_EQ(data[0].cells, (Cells{"-1.5", "2", "lost", "3 to 4"}));
    EXPECT_EQ(data[0].rows, (Rows{4, 5, 2, 3}));
    EXPECT_EQ(data[1].rows, (Rows{2, 3, 4, 5}));
}

TEST(BeginWithNumbers, KeepsRowsTogether) {
    std::vector<Series> data{series({"lost", "", "2"}), series({"1", "2", "3"})};
    begin_with_numbers(data, true, '.');
    EXPECT_EQ(data[0].rows, (Rows{4, 2, 3}));
    EXPECT_EQ(data[1].rows, (Rows{4, 2, 3}));
}

TEST(BeginWithNumbers, KnowsTheDecimalSign) {
    std::vector<Series> data{series({"lost", "1.5", "2,5"})};
    begin_with_numbers(data, false, ',');
    EXPECT_EQ(data[0].cells, (Cells{"2,5", "lost", "1.5"}));
}

TEST(BeginWithNumbers, WithoutAnyNumber) {
    std::vector<Series> data{series({"lost", "gone"}), series({})};
    begin_with_numbers(data, false, '.');
    EXPECT_EQ(data[0].cells, (Cells{"lost", "gone"}));
}

TEST(LibraryCells, TextsBlanksAndANumber) {
    const Series texts = series({"1.5", ""});
    const std::vector<rks_cell> cells = library_cells(texts);
    ASSERT_EQ(cells.size(), 2U);
    EXPECT_EQ(cells[0].kind, RKS_CELL_TEXT);
    EXPECT_EQ(std::string(cells[0].text, cells[0].length), "1.5");
    EXPECT_EQ(cells[1].kind, RKS_CELL_BLANK);
    Series number = series({});
    number.number = 10.0;
    ASSERT_EQ(library_cells(number).size(), 1U);
    EXPECT_EQ(library_cells(number)[0].kind, RKS_CELL_NUMBER);
    EXPECT_EQ(library_cells(number)[0].number, 10.0);
}

} // namespace
} // namespace rankstead::client
