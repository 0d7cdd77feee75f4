// The columns of a table that a study is asked about.
#pragma once

#include "command_line.h"
#include "option_names.h"
#include "series.h"
#include "table.h"

#include <vector>

namespace rankstead::client {

// What was taken from the file, and what was not.
struct Selection {
    std::vector<Series> data;
    std::vector<std::string> notes; // in words: rows that were left out
};

// The position of the one column that has this heading. `option` is the option that asked for it.
std::size_t column_of(const Table& table, const std::string& heading, const std::string& option);

// Wide layout: every data option names a column, or is a number where no column has that heading. At least one has to
// name a column.
Selection select_columns(const Table& table, const OptionNames& names, const CommandLine& line);

} // namespace rankstead::client
