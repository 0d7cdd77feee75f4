#include "selection.h"

#include "failure.h"
#include "words.h"

#include <algorithm>

namespace rankstead::client {
namespace {

std::vector<std::string> positions_of(const Table& table, const std::string& heading) {
    std::vector<std::string> result;
    for (std::size_t column = 0; column < table.headings.size(); ++column) {
        if (table.headings[column] == heading) {
            result.push_back(std::to_string(column + 1));
        }
    }
    return result;
}

struct Separator {
    char sign;
    const char* name;
    const char* option;
};

constexpr Separator separators[] = {
    {';', "semicolons", "';'"}, {'\t', "tabs", "tab"}, {',', "commas", "','"}, {'|', "bars", "'|'"}};

// A single heading with another separator in it is the commonest reason for a column that is not there.
std::string separator_hint(const Table& table) {
    if (table.headings.size() == 1) {
        for (const Separator& separator : separators) {
            if (table.headings.front().find(separator.sign) != std::string::npos) {
                return std::string(" If the columns are separated by ") + separator.name + ", add --separator " +
                       separator.option + '.';
            }
        }
    }
    return "";
}

Failure no_such_column(const Table& table, const std::string& heading, const std::string& option) {
    return usage_failure(table.source + " has no column " + in_quotes(heading) + " (--" + option +
                         "). Its columns are " + list_in_quotes(table.headings) + '.' + separator_hint(table));
}

Failure ambiguous_column(const Table& table, const std::string& heading, const std::vector<std::string>& positions) {
    return data_failure(table.source + ", row 1: the heading " + in_quotes(heading) + " stands over columns " +
                        joined(positions, " and ") + ". Give each column a heading of its own.");
}

Series column_series(const Table& table, const OptionName& name, const std::string& heading) {
    const std::size_t column = column_of(table, heading, name.option);
    Series series{name.word, name.option, heading, heading, {}, {}, {}};
    for (std::size_t i = 0; i < table.records.size(); ++i) {
        series.cells.push_back(table.records[i][column]);
        series.rows.push_back(Table::row_of(i));
    }
    return series;
}

Series series_for(const Table& table, const OptionName& name, const std::string& given) {
    const std::optional<double> number = decimal(given);
    if (number && positions_of(table, given).empty()) {
        return {name.word, name.option, given, "", number, {}, {}};
    }
    return column_series(table, name, given);
}

void refuse_numbers_alone(const Table& table, const std::vector<Series>& data) {
    const bool any_column = std::any_of(data.begin(), data.end(), [](const Series& s) { return !s.number; });
    if (!any_column) {
        throw no_such_column(table, data.front().given, data.front().option);
    }
}

} // namespace

std::size_t column_of(const Table& table, const std::string& heading, const std::string& option) {
    const std::vector<std::string> positions = positions_of(table, heading);
    if (positions.empty()) {
        throw no_such_column(table, heading, option);
    }
    if (positions.size() > 1) {
        throw ambiguous_column(table, heading, positions);
    }
    const auto found = std::find(table.headings.begin(), table.headings.end(), heading);
    return static_cast<std::size_t>(found - table.headings.begin());
}

Selection select_columns(const Table& table, const OptionNames& names, const CommandLine& line) {
    Selection selection;
    for (const OptionName& name : names.data) {
        if (const std::optional<std::string> given = line.one(name.option)) {
            selection.data.push_back(series_for(table, name, *given));
        }
    }
    refuse_numbers_alone(table, selection.data);
    return selection;
}

} // namespace rankstead::client
