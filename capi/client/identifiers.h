// Rows of a table that belong to the same subject.
#pragma once

#include "series.h"
#include "table.h"

#include <cstddef>
#include <limits>
#include <vector>

namespace rankstead::client {

// Stands for the record that a subject does not have.
constexpr std::size_t no_record = std::numeric_limits<std::size_t>::max();

// `records` holds, for each series, the records with its label. The result holds them in the order in which the
// identifiers first appear in the file, so that the same position means the same subject in every series.
// Throws a Failure, with the rows, for a record without identifier and for an identifier that one label has twice.
std::vector<std::vector<std::size_t>> matched_by_identifier(const Table& table, std::size_t identifiers,
                                                            const std::vector<Series>& data,
                                                            const std::vector<std::vector<std::size_t>>& records);

} // namespace rankstead::client
