#include "cell_error.h"

#include <cstring>

namespace rankstead::calc {
namespace {

struct Row {
    rks_status status;
    CellError error;
};

// Statuses that are not listed show #VALUE!.
constexpr Row errors[] = {
    {RKS_UNKNOWN_STUDY, CellError::invalid_argument},
    {RKS_UNKNOWN_ARGUMENT, CellError::invalid_argument},
    {RKS_UNKNOWN_ANSWER, CellError::invalid_argument},
    {RKS_UNKNOWN_SETTING, CellError::invalid_argument},
    {RKS_BAD_SETTING, CellError::invalid_argument},
    {RKS_WRONG_KIND, CellError::invalid_argument},
    {RKS_BAD_DATA, CellError::no_value},
    {RKS_NO_DATA, CellError::no_value},
    {RKS_UNEQUAL_LENGTHS, CellError::no_value},
    {RKS_TOO_LARGE, CellError::no_value},
    {RKS_NO_ANSWER, CellError::not_available},
};

} // namespace

CellError cell_error_for(rks_status status) {
    for (const Row& row : errors)
        if (row.status == status)
            return row.error;
    return CellError::no_value;
}

// Calc reads an error out of the low bits of a quiet NaN. An exception would do for some errors only, would not do
// inside a table, and would cost three times as much.
com::sun::star::uno::Any error_cell(CellError error) {
    const std::uint64_t bits = 0x7ff8000000000000U | static_cast<std::uint64_t>(error);
    double number = 0;
    static_assert(sizeof number == sizeof bits);
    std::memcpy(&number, &bits, sizeof number);
    return com::sun::star::uno::Any(number);
}

} // namespace rankstead::calc
