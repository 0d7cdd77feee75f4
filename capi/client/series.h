// The data of one argument on their way from a file to the library, with the row of every cell.
#pragma once

#include "rankstead.h"

#include <optional>
#include <string>
#include <vector>

namespace rankstead::client {

struct Series {
    std::string argument; // "first"
    std::string option;   // "first", as in --first
    std::string given;    // what the option was given: a heading, a label or a number
    std::string heading;  // of the column that the cells come from; empty for a number
    std::optional<double> number;
    std::vector<std::string> cells;
    std::vector<std::size_t> rows; // of the file, one for each cell; 0 for a cell that no row has
};

// One rks_cell for each cell; they borrow the texts of the series.
std::vector<rks_cell> library_cells(const Series& series);

// A text in the first cell is a heading to the library, as on a sheet, where the headings are part of the range. In a
// file they are a row of their own, so a text in the first cell is a measurement that cannot be read, and has to be
// reported as one. So where the first cell is a text, cells are given from the first plain number on, and those before
// it at the end: the order of the cells means nothing to a study. With `together`, the cells of a row stay together.
void begin_with_numbers(std::vector<Series>& data, bool together, char decimal_sign);

} // namespace rankstead::client
