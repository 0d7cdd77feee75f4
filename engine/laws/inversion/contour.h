// One contour of inversion: the tail it is for, its tilt, the lattice of its frequencies, and which of them matter.
#pragma once

#include "contour_lattice.h"
#include "frequency_screen.h"

namespace rankstead {

struct Contour {
    SoughtTail tail;
    ContourTilt tilt;
    ContourLattice lattice;
    Need need; // what is left out at a frequency is at most exp(-need)

    [[nodiscard]] const Characteristic& law() const { return tail.law(); }
};

} // namespace rankstead
