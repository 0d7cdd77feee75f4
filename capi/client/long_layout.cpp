#include "long_layout.h"

#include "failure.h"
#include "identifiers.h"
#include "words.h"

#include <algorithm>
#include <set>

namespace rankstead::client {
namespace {

struct Columns {
    std::size_t values, labels;
};

Columns columns_of(const Table& table, const CommandLine& line) {
    return {column_of(table, line.needed("values"), "values"), column_of(table, line.needed("labels"), "labels")};
}

std::vector<std::string> distinct(const Table& table, std::size_t column) {
    std::vector<std::string> result;
    std::set<std::string> seen;
    for (const Record& record : table.records) {
        if (!record[column].empty() && seen.insert(record[column]).second) {
            result.push_back(record[column]);
        }
    }
    return result;
}

Failure no_such_label(const Table& table, std::size_t labels, const Series& series) {
    return usage_failure("In " + table.source + " no row has " + in_quotes(series.given) + " in the column " +
                         in_quotes(table.headings[labels]) + " (--" + series.option + "). Its labels are " +
                         list_in_quotes(distinct(table, labels)) + '.');
}

// The records with the label of the series.
std::vector<std::size_t> records_labelled(const Table& table, std::size_t labels, const Series& series) {
    std::vector<std::size_t> result;
    for (std::size_t i = 0; i < table.records.size(); ++i) {
        if (table.records[i][labels] == series.given) {
            result.push_back(i);
        }
    }
    if (result.empty()) {
        throw no_such_label(table, labels, series);
    }
    return result;
}

void append(Series& series, const Table& table, std::size_t record, std::size_t values) {
    const bool exists = record != no_record;
    series.cells.push_back(exists ? table.records[record][values] : std::string());
    series.rows.push_back(exists ? Table::row_of(record) : 0);
}

std::vector<Series> empty_series(const Table& table, const Columns& columns, const OptionNames& names,
                                 const CommandLine& line) {
    std::vector<Series> data;
    for (const OptionName& name : names.data) {
        if (const std::optional<std::string> label = line.one(name.option)) {
            data.push_back({name.word, name.option, *label, table.headings[columns.values], {}, {}, {}});
        }
    }
    return data;
}

void refuse_one_label_twice(const std::vector<Series>& data) {
    std::set<std::string> seen;
    for (const Series& series : data) {
        if (!seen.insert(series.given).second) {
            throw usage_failure("The label " + in_quotes(series.given) +
                                " is given for two arguments: the same values would be compared with themselves.");
        }
    }
}

void check_id_option(const CommandLine& line, bool row_by_row) {
    if (row_by_row && !line.has("id")) {
        throw usage_failure("In the long layout the two values of a pair stand in different rows. Add --id COLUMN, the "
                            "column that says which rows belong to the same subject." +
                            line.see_help());
    }
    if (!row_by_row && line.has("id")) {
        throw usage_failure("--id is for studies that take the values of a subject together. This one compares "
                            "separate groups: leave --id out, or ask for another study." +
                            line.see_help());
    }
}

std::vector<std::string> rows_left_out(const Table& table, const Columns& columns, const std::vector<Series>& data) {
    const auto left_out = std::count_if(table.records.begin(), table.records.end(), [&](const Record& record) {
        return std::none_of(data.begin(), data.end(),
                            [&](const Series& series) { return series.given == record[columns.labels]; });
    });
    if (left_out == 0) {
        return {};
    }
    return {counted(static_cast<std::size_t>(left_out), "row") + " left out: another label, or none, in the column " +
            in_quotes(table.headings[columns.labels])};
}

} // namespace

bool asks_for_long_layout(const CommandLine& line) {
    return line.has("values") || line.has("labels") || line.has("id");
}

Selection select_by_label(const Table& table, const OptionNames& names, const CommandLine& line, bool row_by_row) {
    check_id_option(line, row_by_row);
    const Columns columns = columns_of(table, line);
    std::vector<Series> data = empty_series(table, columns, names, line);
    refuse_one_label_twice(data);
    std::vector<std::vector<std::size_t>> records;
    records.reserve(data.size());
    for (const Series& series : data) {
        records.push_back(records_labelled(table, columns.labels, series));
    }
    if (row_by_row) {
        records = matched_by_identifier(table, column_of(table, line.needed("id"), "id"), data, records);
    }
    for (std::size_t i = 0; i < data.size(); ++i) {
        for (const std::size_t record : records[i]) {
            append(data[i], table, record, columns.values);
        }
    }
    std::vector<std::string> notes = rows_left_out(table, columns, data);
    return {std::move(data), std::move(notes)};
}

} // namespace rankstead::client
