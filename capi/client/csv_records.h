// Comma-separated text into records, by libcsv.
#pragma once

#include <string>
#include <string_view>
#include <vector>

namespace rankstead::client {

using Record = std::vector<std::string>;

// Every record of `text`, empty lines included as records without fields, so that the position of a record is the row
// that a spreadsheet shows it in, whatever line breaks its quoted fields contain. Unquoted fields lose the blanks
// around them (RFC 4180 apart, this is what spreadsheets write and people type). `source` names the text in messages.
// Throws a Failure, with the row, where quotation marks do not match.
std::vector<Record> csv_records(std::string_view text, char separator, const std::string& source);

} // namespace rankstead::client
