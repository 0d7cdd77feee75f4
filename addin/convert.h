// From what Calc hands over to rks_cell, and from answers to what Calc shows.
#ifndef RANKSTEAD_ADDIN_CONVERT_H
#define RANKSTEAD_ADDIN_CONVERT_H

#include "range.h"

#include <rankstead.h>

#include <rtl/string.hxx>
#include <rtl/ustring.hxx>

#include <string>
#include <vector>

namespace rankstead::calc {

// The first rows of a range as cells, row by row, with the texts they point to.
class Cells {
public:
    Cells(const Range& range, std::size_t rows);

    const rks_cell* data() const { return cells.data(); }
    std::size_t rows() const { return row_count; }
    std::size_t columns() const { return column_count; }

private:
    rks_cell cell(const com::sun::star::uno::Any& value);

    std::size_t row_count;
    std::size_t column_count;
    std::vector<rtl::OString> texts;
    std::vector<rks_cell> cells;
};

// One value as UTF-8 text; false if it is not a text.
bool text_of(const com::sun::star::uno::Any& value, std::string& text);

rtl::OUString utf16(const char* text, std::size_t length);

com::sun::star::uno::Any to_calc(double number);
com::sun::star::uno::Any to_calc(const char* text, std::size_t length);
com::sun::star::uno::Any to_calc(const rks_cell* table, std::size_t rows, std::size_t columns);

} // namespace rankstead::calc

#endif
