// Long layout: one column holds the values of all groups, another says which group each belongs to.
#pragma once

#include "selection.h"

namespace rankstead::client {

// Whether any option of the long layout is given.
bool asks_for_long_layout(const CommandLine& line);

// The values whose label is that of a data option go to its argument, in the order of the file. Where the study goes
// row by row, values belong together when their identifiers agree: the column of these is then needed, an identifier
// may occur once for each label, and one that lacks a label leaves a blank there.
Selection select_by_label(const Table& table, const OptionNames& names, const CommandLine& line, bool row_by_row);

} // namespace rankstead::client
