// Cell errors: the one table from what became of an inquiry to the error that Calc shows.
#ifndef RANKSTEAD_ADDIN_CELL_ERROR_H
#define RANKSTEAD_ADDIN_CELL_ERROR_H

#include <rankstead.h>

#include <com/sun/star/uno/Any.hxx>

#include <cstdint>

namespace rankstead::calc {

// Calc's numbers of its own errors.
enum class CellError : std::uint16_t {
    invalid_argument = 502, // Err:502
    no_value = 519,         // #VALUE!
    not_available = 32767   // #N/A
};

CellError cell_error_for(rks_status status);

// A cell that is in error.
com::sun::star::uno::Any error_cell(CellError error);

} // namespace rankstead::calc

#endif
