// What came of the cases of one shape.
#pragma once

#include "big_laws.h"
#include "laws/tails.h"

#include <map>
#include <string>
#include <vector>

namespace rankstead::accuracy {

using test::Big;
using test::BigTails;

inline constexpr const char* table_head =
    "| shape | cases | p | largest error | largest bound | largest error / bound | "
    "laws | without law | wrong | inversion asked for | it gave none |\n"
    "|---|---|---|---|---|---|---|---|---|---|---|";

inline constexpr double largest_useful_bound = 1e-10;
inline constexpr double other_tail_error = 1e-13; // absolute, of the larger tail

struct Tally {
    std::string shape;
    int cases = 0;         // with a p that a double can hold
    int below_doubles = 0; // the others
    double smallest_p = 1;
    double largest_p = 0;
    double largest_error = 0; // relative, of the smaller tail
    double largest_bound = 0;
    double largest_ratio = 0;    // of error and bound
    std::map<LawKind, int> laws; // that answered
    int by_inversion = 0;        // inversion asked where the chooser prefers the dynamic programme
    int inversion_gave_none = 0;
    std::vector<std::string> wrong;       // a bound exceeded or too wide, or the other tail off: never allowed
    std::vector<std::string> without_law; // LawTooLong

    [[nodiscard]] std::string row() const; // of a table in Markdown, as in table_head

    void count_case(const BigTails& exact);
    // Compares the smaller tail with its bound, the larger one with the truth.
    void compare(const Tails& tails, const BigTails& exact, const std::string& which);
    void compare_lower(double lower, double bound, const BigTails& exact, const std::string& which);
};

[[nodiscard]] BigTails swapped(const BigTails& tails);

} // namespace rankstead::accuracy
