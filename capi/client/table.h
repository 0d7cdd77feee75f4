// A CSV file: one row of headings above rows of cells.
#pragma once

#include "csv_records.h"

#include <cstddef>
#include <istream>
#include <string>
#include <vector>

namespace rankstead::client {

inline constexpr const char* standard_input_name = "standard input";

struct Table {
    std::string source; // what messages call it
    std::vector<std::string> headings;
    std::vector<Record> records; // each as long as headings

    // The row of a record in the file: the headings are row 1.
    static std::size_t row_of(std::size_t record) { return record + 2; }
};

// Reads `file`, or `standard_input` where it is "-". Throws a Failure for what cannot be read as a table.
Table read_table(const std::string& file, char separator, std::istream& standard_input);

// The text of --separator: one character, or the word tab.
char separator_from(const std::string& text);

} // namespace rankstead::client
