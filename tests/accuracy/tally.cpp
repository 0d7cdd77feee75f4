#include "tally.h"

#include <algorithm>
#include <cmath>
#include <limits>
#include <sstream>

namespace rankstead::accuracy {

namespace {

double ratio_of(const Big& part, const Big& whole) {
    return static_cast<double>(part.convert_to<long double>() / whole.convert_to<long double>());
}

bool is_below_doubles(double p) {
    return p < std::numeric_limits<double>::min();
}

std::string described(const std::string& which, double p, double error, double bound) {
    std::ostringstream text;
    text << which << ", p " << p << ": error " << error << ", bound " << bound;
    return text.str();
}

const char* name_of(LawKind law) {
    switch (law) {
    case LawKind::counted:
        return "counted";
    case LawKind::summed:
        return "summed";
    case LawKind::closed:
        return "closed";
    case LawKind::inverted:
        return "inverted";
    default:
        return "other";
    }
}

} // namespace

BigTails swapped(const BigTails& tails) {
    return {tails.upper, tails.lower, tails.total};
}

void Tally::count_case(const BigTails& exact) {
    const double p = ratio_of(std::min(exact.lower, exact.upper), exact.total);
    if (is_below_doubles(p)) {
        ++below_doubles;
        return;
    }
    ++cases;
    smallest_p = std::min(smallest_p, p);
    largest_p = std::max(largest_p, p);
}

// A tail that no double can hold has no useful bound, but still must not break the one stated.
void Tally::compare_lower(double lower, double bound, const BigTails& exact, const std::string& which) {
    const double p = ratio_of(exact.lower, exact.total);
    const double error = test::relative_error(lower, exact.lower, exact.total);
    const bool below = is_below_doubles(p);
    // Written so that NaN is wrong too.
    if (!(error <= bound) || !(below || bound <= largest_useful_bound)) {
        wrong.push_back(described(which, p, error, bound));
    }
    if (!below) {
        largest_error = std::max(largest_error, error);
        largest_bound = std::max(largest_bound, bound);
        largest_ratio = std::max(largest_ratio, error > 0 ? error / bound : 0);
    }
}

void Tally::compare(const Tails& tails, const BigTails& exact, const std::string& which) {
    if (exact.upper < exact.lower) {
        compare(tails.swapped(), swapped(exact), which + ", upper tail");
        return;
    }
    ++laws[tails.law];
    compare_lower(tails.lower, tails.relative_error, exact, which);
    const double off = std::fabs(tails.upper - ratio_of(exact.upper, exact.total));
    if (!(off <= other_tail_error)) {
        wrong.push_back(
            described("larger tail of " + which, ratio_of(exact.lower, exact.total), off, other_tail_error));
    }
}

std::string Tally::row() const {
    std::ostringstream text;
    text.precision(2);
    text << "| " << shape << " | " << cases << " | " << smallest_p << " to " << largest_p << " | " << largest_error
         << " | " << largest_bound << " | " << largest_ratio << " |";
    for (const auto& [law, times] : laws) {
        text << ' ' << name_of(law) << ' ' << times;
    }
    text << " | " << without_law.size() << " | " << wrong.size() << " | " << by_inversion << " | "
         << inversion_gave_none << " |";
    return text.str();
}

} // namespace rankstead::accuracy
