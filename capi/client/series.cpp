#include "series.h"

#include <algorithm>

namespace rankstead::client {
namespace {

bool digits(std::string_view text) {
    return !text.empty() && std::all_of(text.begin(), text.end(), [](char c) { return c >= '0' && c <= '9'; });
}

// The plainest numbers only: whatever else the library reads as one may as well follow.
bool is_plain_number(std::string_view text, char decimal_sign) {
    if (text.starts_with('-')) {
        text.remove_prefix(1);
    }
    const std::size_t sign = text.find(decimal_sign);
    return digits(text.substr(0, sign)) && (sign == std::string_view::npos || digits(text.substr(sign + 1)));
}

bool plain_in_all(const std::vector<Series*>& data, std::size_t cell, char decimal_sign) {
    return std::all_of(data.begin(), data.end(), [&](const Series* series) {
        return cell < series->cells.size() && is_plain_number(series->cells[cell], decimal_sign);
    });
}

bool begins_with_text(const Series* series, char decimal_sign) {
    return !series->cells.empty() && !series->cells.front().empty() &&
           !is_plain_number(series->cells.front(), decimal_sign);
}

void rotate_by(Series& series, std::size_t cells) {
    const auto middle = static_cast<std::ptrdiff_t>(cells);
    std::rotate(series.cells.begin(), series.cells.begin() + middle, series.cells.end());
    std::rotate(series.rows.begin(), series.rows.begin() + middle, series.rows.end());
}

void begin_together(const std::vector<Series*>& data, char decimal_sign) {
    if (std::none_of(data.begin(), data.end(), [&](Series* s) { return begins_with_text(s, decimal_sign); })) {
        return;
    }
    for (std::size_t cell = 0; cell < data.front()->cells.size(); ++cell) {
        if (plain_in_all(data, cell, decimal_sign)) {
            for (Series* series : data) {
                rotate_by(*series, cell);
            }
            return;
        }
    }
}

rks_cell text_cell(const std::string& text) {
    return {text.empty() ? RKS_CELL_BLANK : RKS_CELL_TEXT, 0, 0.0, text.data(), text.size()};
}

} // namespace

std::vector<rks_cell> library_cells(const Series& series) {
    if (series.number) {
        return {{RKS_CELL_NUMBER, 0, *series.number, nullptr, 0}};
    }
    std::vector<rks_cell> result(series.cells.size());
    std::transform(series.cells.begin(), series.cells.end(), result.begin(), text_cell);
    return result;
}

void begin_with_numbers(std::vector<Series>& data, bool together, char decimal_sign) {
    std::vector<Series*> columns;
    for (Series& series : data) {
        if (!series.number) {
            columns.push_back(&series);
        }
    }
    if (together) {
        return begin_together(columns, decimal_sign);
    }
    for (Series* series : columns) {
        begin_together({series}, decimal_sign);
    }
}

} // namespace rankstead::client
