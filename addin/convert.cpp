#include "convert.h"

#include "cell_error.h"

#include <algorithm>
#include <stdexcept>

namespace rankstead::calc {

using com::sun::star::uno::Any;
using com::sun::star::uno::Sequence;
using rtl::OUString;

namespace {

rtl::OString utf8(const OUString& text) {
    return rtl::OUStringToOString(text, RTL_TEXTENCODING_UTF8);
}

Any status_cell(rks_status status) {
    return status == RKS_BLANK ? to_calc("", 0) : error_cell(cell_error_for(status));
}

// Blank cells of a table become empty texts: nothing at all would look blank but count as 0.
Any table_cell(const rks_cell& cell) {
    switch (cell.kind) {
    case RKS_CELL_NUMBER:
        return to_calc(cell.number);
    case RKS_CELL_TEXT:
        return to_calc(cell.text, cell.length);
    case RKS_CELL_STATUS:
        return status_cell(static_cast<rks_status>(cell.number));
    default:
        return to_calc("", 0);
    }
}

} // namespace

Cells::Cells(const Range& range, std::size_t rows) : row_count(rows), column_count(range.columns()) {
    cells.reserve(std::max<std::size_t>(1, rows * column_count)); // never without storage, so data() is never null
    for (std::size_t row = 0; row < rows; ++row)
        for (std::size_t column = 0; column < column_count; ++column)
            cells.push_back(cell(range.at(row, column)));
}

rks_cell Cells::cell(const Any& value) {
    OUString text;
    double number = 0;
    if (is_blank(value))
        return {RKS_CELL_BLANK, 0, 0, nullptr, 0};
    if (value >>= text) {
        texts.push_back(utf8(text));
        return {RKS_CELL_TEXT, 0, 0, texts.back().getStr(), static_cast<std::size_t>(texts.back().getLength())};
    }
    if (value >>= number)
        return {RKS_CELL_NUMBER, 0, number, nullptr, 0};
    throw std::invalid_argument("neither a number nor a text");
}

OUString utf16(const char* text, std::size_t length) {
    return {text, static_cast<sal_Int32>(length), RTL_TEXTENCODING_UTF8};
}

bool text_of(const Any& value, std::string& text) {
    OUString wide;
    if (!(value >>= wide))
        return false;
    const rtl::OString narrow = utf8(wide);
    text.assign(narrow.getStr(), static_cast<std::size_t>(narrow.getLength()));
    return true;
}

Any to_calc(double number) {
    return Any(number);
}

Any to_calc(const char* text, std::size_t length) {
    return Any(utf16(text, length));
}

Any to_calc(const rks_cell* table, std::size_t rows, std::size_t columns) {
    Sequence<Sequence<Any>> block(static_cast<sal_Int32>(rows));
    Sequence<Any>* row = block.getArray();
    for (std::size_t i = 0; i < rows; ++i) {
        row[i].realloc(static_cast<sal_Int32>(columns));
        std::transform(table + i * columns, table + (i + 1) * columns, row[i].getArray(), table_cell);
    }
    return Any(block);
}

} // namespace rankstead::calc
