// How a study was asked: the settings in force, as typed values. Their words are rows of the catalogue.
#pragma once

#include "decimal.h"

#include <cstdint>
#include <string>
#include <vector>

namespace rankstead {

enum class Side { two_sided, higher, lower };
enum class Test { signed_rank, sign };
enum class Zeros { drop, pratt };
enum class Method { automatic, exact, approximate };
enum class IntervalRule { matching, table };
enum class ChanceInterval { placement, newcombe };
enum class BeyondLimit { refuse };
enum class NumberTexts { refused, point, comma };
enum class DecimalSign { point, comma };

// A probability as the fraction it is written as, so that 1 - 0.9 is one tenth exactly.
struct Fraction {
    std::int64_t numerator = 0;
    std::int64_t denominator = 1;
    [[nodiscard]] double value() const { return static_cast<double>(numerator) / static_cast<double>(denominator); }
};

struct Settings {
    Side side = Side::two_sided;
    Decimal level{95, -2};
    Test test = Test::signed_rank;
    Zeros zeros = Zeros::drop;
    Method method = Method::automatic;
    IntervalRule interval = IntervalRule::matching;
    ChanceInterval chance_interval = ChanceInterval::placement;
    Decimal margin;
    BeyondLimit limits = BeyondLimit::refuse;
    std::vector<std::string> missing;
    NumberTexts numbers = NumberTexts::refused;
    DecimalSign decimal_sign = DecimalSign::point;
    std::string unit;
    std::string first_name;
    std::string second_name;
};

// 1 - level.
[[nodiscard]] Fraction error_rate(const Settings& settings);

// What each limit may miss: half of it two-sided, all of it one-sided.
[[nodiscard]] Fraction tail_rate(const Settings& settings);

// The decimal `alpha`, in [0, 1], as a fraction; digits beyond the 18th decimal are cut off.
[[nodiscard]] Fraction as_fraction(const Decimal& alpha);

} // namespace rankstead
