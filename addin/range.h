// What Calc hands over for one argument: nothing, one value, or a range of cells.
#ifndef RANKSTEAD_ADDIN_RANGE_H
#define RANKSTEAD_ADDIN_RANGE_H

#include <com/sun/star/uno/Any.hxx>
#include <com/sun/star/uno/Sequence.hxx>

#include <cstddef>

namespace rankstead::calc {

class Range {
public:
    explicit Range(const com::sun::star::uno::Any& argument);

    bool given() const { return row_count > 0 && column_count > 0; }
    std::size_t rows() const { return row_count; }
    std::size_t columns() const { return column_count; }
    const com::sun::star::uno::Any& at(std::size_t row, std::size_t column) const;

    // Rows down to the last one that holds anything.
    std::size_t filled_rows() const;

private:
    using Block = com::sun::star::uno::Sequence<com::sun::star::uno::Sequence<com::sun::star::uno::Any>>;

    bool row_is_blank(std::size_t row) const;

    com::sun::star::uno::Any single;
    Block block;
    std::size_t row_count = 0;
    std::size_t column_count = 0;
};

// A blank cell inside a range arrives as a text of length 0, as does a formula that gives "".
bool is_blank(const com::sun::star::uno::Any& cell);

} // namespace rankstead::calc

#endif
