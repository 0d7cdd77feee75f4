#include "table.h"

#include "failure.h"
#include "utf8.h"
#include "words.h"

#include <cerrno>
#include <filesystem>
#include <fstream>
#include <iterator>
#include <system_error>

namespace rankstead::client {
namespace {

std::string all_bytes(std::istream& in, const std::string& source) {
    std::string bytes{std::istreambuf_iterator<char>(in), std::istreambuf_iterator<char>()};
    if (in.bad()) {
        throw data_failure(source + " could not be read to its end.");
    }
    return bytes;
}

std::string file_bytes(const std::string& file) {
    std::error_code error;
    if (std::filesystem::is_directory(file, error)) {
        throw usage_failure(file + " is a folder, not a file.");
    }
    errno = 0;
    std::ifstream in(file, std::ios::binary);
    if (!in) {
        throw usage_failure(file + " cannot be opened: " + std::generic_category().message(errno) + '.');
    }
    return all_bytes(in, file);
}

void refuse_other_encodings(const std::vector<Record>& records, const std::string& source) {
    for (std::size_t row = 0; row < records.size(); ++row) {
        for (std::size_t column = 0; column < records[row].size(); ++column) {
            if (!is_utf8_text(records[row][column])) {
                throw data_failure(source + ", row " + std::to_string(row + 1) + ", column " +
                                   std::to_string(column + 1) +
                                   ": this is not UTF-8 text. Save the file as CSV with the character set UTF-8.");
            }
        }
    }
}

// An empty line is a row of blanks, wherever it stands; at the end of a file it is nothing.
void fill_empty_lines(Table& table) {
    while (!table.records.empty() && table.records.back().empty()) {
        table.records.pop_back();
    }
    for (Record& record : table.records) {
        if (record.empty()) {
            record.resize(table.headings.size());
        }
    }
}

void refuse_ragged_rows(const Table& table) {
    for (std::size_t i = 0; i < table.records.size(); ++i) {
        if (table.records[i].size() != table.headings.size()) {
            throw data_failure(table.source + ", row " + std::to_string(Table::row_of(i)) + ": " +
                               counted(table.records[i].size(), "cell") + " where the headings in row 1 have " +
                               std::to_string(table.headings.size()) +
                               ". Give every row the same number of cells; a cell that contains the separator is "
                               "written in quotation marks.");
        }
    }
}

void refuse_empty_table(const Table& table) {
    if (table.headings.empty()) {
        throw data_failure(table.source + " is empty: its first row has to hold the headings of the columns.");
    }
    if (table.records.empty()) {
        throw data_failure(table.source + " has no rows below its headings.");
    }
}

Table table_from(std::vector<Record> records, const std::string& source) {
    Table table{source, {}, {}};
    if (!records.empty()) {
        table.headings = std::move(records.front());
        records.erase(records.begin());
    }
    table.records = std::move(records);
    fill_empty_lines(table);
    return table;
}

} // namespace

Table read_table(const std::string& file, char separator, std::istream& standard_input) {
    const bool standard = file == "-";
    const std::string source = standard ? standard_input_name : file;
    const std::string bytes = standard ? all_bytes(standard_input, source) : file_bytes(file);
    std::vector<Record> records = csv_records(without_byte_order_mark(bytes), separator, source);
    refuse_other_encodings(records, source);
    Table table = table_from(std::move(records), source);
    refuse_empty_table(table);
    refuse_ragged_rows(table);
    return table;
}

char separator_from(const std::string& text) {
    if (folded(text) == "tab" || text == "\\t") {
        return '\t';
    }
    const bool usable = text.size() == 1 && static_cast<unsigned char>(text[0]) < 0x80 && text[0] != '"' &&
                        text[0] != '\n' && text[0] != '\r';
    if (!usable) {
        throw usage_failure("--separator takes one character such as ; or the word tab, not " + in_quotes(text) + '.');
    }
    return text[0];
}

} // namespace rankstead::client
