// The tests of one list of values against an origin, shared by single (the values) and pairs (the changes).
#pragma once

#include "../grid.h"
#include "../outcome.h"

#include <vector>

namespace rankstead {

template <class Int>
struct OneSample {
    std::vector<Int> sorted; // ascending, not empty
    Int reference;           // what a rise is counted from: 0 for changes
    Int origin;              // reference plus margin: what is tested
    Grid grid;
};

// Fills every answer but the description of the samples. Needs outcome.settings.
template <class Int>
void analyse_one_sample(Outcome& outcome, const OneSample<Int>& sample);

} // namespace rankstead
