#include "identifiers.h"

#include "failure.h"
#include "words.h"

#include <algorithm>
#include <map>

namespace rankstead::client {
namespace {

using Records = std::map<std::string, std::size_t>; // identifier to record

std::string row(std::size_t record) {
    return "row " + std::to_string(Table::row_of(record));
}

Failure no_identifier(const Table& table, std::size_t identifiers, std::size_t record) {
    return data_failure(table.source + ", column " + in_quotes(table.headings[identifiers]) + ", " + row(record) +
                        ": there is no identifier, so this row cannot be matched with another. Enter it, or leave out "
                        "the row.");
}

Failure identifier_twice(const Table& table, std::size_t identifiers, const Series& series, std::size_t one,
                         std::size_t other) {
    return data_failure(table.source + ", column " + in_quotes(table.headings[identifiers]) + ": the identifier " +
                        in_quotes(table.records[one][identifiers]) + " occurs twice for " + in_quotes(series.given) +
                        ", in " + row(one) + " and " + row(other) + ". Keep one of these rows.");
}

Records by_identifier(const Table& table, std::size_t identifiers, const Series& series,
                      const std::vector<std::size_t>& records) {
    Records result;
    for (const std::size_t record : records) {
        const std::string& identifier = table.records[record][identifiers];
        if (identifier.empty()) {
            throw no_identifier(table, identifiers, record);
        }
        const auto [place, fresh] = result.emplace(identifier, record);
        if (!fresh) {
            throw identifier_twice(table, identifiers, series, place->second, record);
        }
    }
    return result;
}

// The identifiers of all these records, in the order of the file.
std::vector<std::string> subjects(const Table& table, std::size_t identifiers, const std::vector<Records>& matched) {
    std::map<std::size_t, std::string> by_first_record;
    std::map<std::string, std::size_t> first;
    for (const Records& records : matched) {
        for (const auto& [identifier, record] : records) {
            const auto [place, fresh] = first.emplace(identifier, record);
            place->second = std::min(place->second, record);
        }
    }
    for (const auto& [identifier, record] : first) {
        by_first_record.emplace(record, table.records[record][identifiers]);
    }
    std::vector<std::string> result;
    result.reserve(by_first_record.size());
    for (const auto& [record, identifier] : by_first_record) {
        result.push_back(identifier);
    }
    return result;
}

std::vector<std::size_t> records_of(const std::vector<std::string>& subjects, const Records& records) {
    std::vector<std::size_t> result;
    result.reserve(subjects.size());
    for (const std::string& subject : subjects) {
        const auto found = records.find(subject);
        result.push_back(found == records.end() ? no_record : found->second);
    }
    return result;
}

} // namespace

std::vector<std::vector<std::size_t>> matched_by_identifier(const Table& table, std::size_t identifiers,
                                                            const std::vector<Series>& data,
                                                            const std::vector<std::vector<std::size_t>>& records) {
    std::vector<Records> matched;
    for (std::size_t i = 0; i < data.size(); ++i) {
        matched.push_back(by_identifier(table, identifiers, data[i], records[i]));
    }
    std::vector<std::vector<std::size_t>> result;
    result.reserve(matched.size());
    const std::vector<std::string> order = subjects(table, identifiers, matched);
    for (const Records& one : matched) {
        result.push_back(records_of(order, one));
    }
    return result;
}

} // namespace rankstead::client
