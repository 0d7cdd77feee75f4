// The only place where cells become numbers: headings, missing words, text numbers, positions of cells that cannot be
// used, pairing row by row, and the ledger that accounts for every cell.
#pragma once

#include "cell.h"
#include "decimal.h"
#include "settings.h"

#include <cstddef>
#include <optional>
#include <string>
#include <vector>

namespace rankstead {

// Where the cells of one argument went: seen = used + blank + heading + missing_words + censored + unpaired.
struct Ledger {
    std::string argument;
    std::size_t seen = 0;
    std::size_t used = 0;
    std::size_t blank = 0;
    std::size_t heading = 0;
    std::size_t missing_words = 0;
    std::size_t censored = 0;
    std::size_t unpaired = 0;
};

// One argument, read. `values` are in the order of the cells.
struct Column {
    std::string heading;
    std::vector<Decimal> values;
    Ledger ledger;
};

struct PairedColumns {
    Column first;
    Column second;
    std::size_t equal_at_fifteen_digits = 0; // pairs equal as decimals though not as binary numbers
};

// Cells that are blank after the last filled one are not counted: a selection often reaches beyond the data.
// Throws Refusal (bad_data with the place, or no_data if not one value is left).
[[nodiscard]] Column read_column(const Block& block, const Settings& settings);

// Reads two arguments row by row and keeps the rows in which both have a value. Throws as read_column, and
// unequal_lengths.
[[nodiscard]] PairedColumns read_pairs(const Block& first, const Block& second, const Settings& settings);

// Reads an argument that must be a single number. Throws as read_column.
[[nodiscard]] Decimal read_number(const Block& block, const Settings& settings);

} // namespace rankstead
