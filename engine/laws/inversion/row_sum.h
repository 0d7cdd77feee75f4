// The sum over the points s of a row, at one t, of exp(T - T at the tilt) e^(-itw), with a bound on its rounding.
#pragma once

#include "contour_parts.h"

namespace rankstead {

struct RowSum {
    Complex value = 0;
    double rounding = 0;
};

} // namespace rankstead
