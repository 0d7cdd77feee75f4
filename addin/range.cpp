#include "range.h"

#include <rtl/ustring.hxx>

#include <utility>

namespace rankstead::calc {

using com::sun::star::uno::Any;

Range::Range(const Any& argument) {
    if (!argument.hasValue())
        return;
    if (argument >>= block) {
        row_count = static_cast<std::size_t>(block.getLength());
        // Through a const view: the other one would copy a million rows that Calc still holds.
        column_count = row_count == 0 ? 0 : static_cast<std::size_t>(std::as_const(block)[0].getLength());
        return;
    }
    single = argument;
    row_count = column_count = 1;
}

// Calc's rows are equally long; should one be short, what it lacks is blank (`single` is, when there is a block).
const Any& Range::at(std::size_t row, std::size_t column) const {
    if (block.getLength() == 0)
        return single;
    const com::sun::star::uno::Sequence<Any>& cells = block[static_cast<sal_Int32>(row)];
    return column < static_cast<std::size_t>(cells.getLength()) ? cells[static_cast<sal_Int32>(column)] : single;
}

bool Range::row_is_blank(std::size_t row) const {
    for (std::size_t column = 0; column < column_count; ++column)
        if (!is_blank(at(row, column)))
            return false;
    return true;
}

std::size_t Range::filled_rows() const {
    std::size_t rows = row_count;
    while (rows > 0 && row_is_blank(rows - 1))
        --rows;
    return rows;
}

bool is_blank(const Any& cell) {
    if (!cell.hasValue())
        return true;
    const auto* text = static_cast<const rtl::OUString*>(
        cell.getValueTypeClass() == com::sun::star::uno::TypeClass_STRING ? cell.getValue() : nullptr);
    return text != nullptr && text->isEmpty();
}

} // namespace rankstead::calc
