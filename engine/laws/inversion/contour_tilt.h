// The saddlepoint through which the contour of an inversion leads (Daniels 1954; Lugannani & Rice 1980).
#pragma once

#include "sought_tail.h"

namespace rankstead {

struct ContourTilt {
    double a = 0;
    double lambda = 0;
    Jet jet; // of T at (a, -lambda)
    double count_variance = 0;
    double sum_variance = 0; // given the count, if that is fixed
};

// The tilt at which T(a, -lambda) + lambda * distance - log(1 - e^-lambda) is least, to a few per cent of a standard
// deviation, with lambda at least two standard deviations' reciprocal. Any tilt bounds the tail (Chernoff): at one that
// puts it beyond the range of a double the search ends, without variances.
[[nodiscard]] ContourTilt find_tilt(const SoughtTail& tail);

// Logarithm of Chernoff's bound on the tail, T(a, -lambda) + lambda * distance - log P(count).
[[nodiscard]] double log_chernoff_bound(const SoughtTail& tail, const ContourTilt& tilt);

inline constexpr double log_smallest = -760; // exp of it is 0

// Finite, and with enough spread left that the law is not all but a single point: at the very end of the range the
// saddlepoint runs away.
[[nodiscard]] bool is_sound(const SoughtTail& tail, const ContourTilt& tilt);

// The number of arrangements at w, relative to the contour's height, is about this; it is checked at the end.
[[nodiscard]] double expected_value(const SoughtTail& tail, const ContourTilt& tilt);

// T at (a, -lambda), in the way that serves there.
[[nodiscard]] Jet jet_at(const Characteristic& law, double a, double lambda);

struct TiltStep {
    double a = 0;
    double lambda = 0;
};

// The first derivatives by a and lambda of a function to be minimised, and the second by lambda; its others are T's.
struct TiltSlope {
    double by_a = 0;
    double by_lambda = 0;
    double by_lambda_twice = 0;
};

// Newton's step towards the least; a moves only if the count is fixed, lambda only if it is free.
[[nodiscard]] TiltStep newton_step(const Jet& jet, const TiltSlope& slope, bool count_is_fixed, bool lambda_is_free);

} // namespace rankstead
