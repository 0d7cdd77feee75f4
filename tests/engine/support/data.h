// Data for the studies as short as a test can write them, and repeatable random numbers.
#pragma once

#include "cell.h"
#include "outcome.h"
#include "settings.h"

#include <cstdint>
#include <random>
#include <string>
#include <string_view>
#include <vector>

namespace rankstead::test {

[[nodiscard]] Block column(std::string argument, const std::vector<double>& numbers);
[[nodiscard]] Block cells(std::string argument, std::vector<Cell> cells);

[[nodiscard]] inline Cell text(std::string_view words) {
    return Cell::of(words);
}
[[nodiscard]] inline Cell number(double value) {
    return Cell::of(value);
}
[[nodiscard]] inline Cell blank() {
    return {};
}

// Settings from words, as users write them: with("side=higher; level=0.9"). The study decides which fit.
[[nodiscard]] Settings with(std::string_view study, std::string_view settings);

[[nodiscard]] Outcome single(const std::vector<double>& values, double reference, std::string_view settings = "");
// Changes straight from a list: before is 0.
[[nodiscard]] Outcome changes(const std::vector<double>& changes, std::string_view settings = "");
[[nodiscard]] Outcome groups(const std::vector<double>& first, const std::vector<double>& second,
                             std::string_view settings = "");

// An answer as the catalogue reads it; a number answer only.
[[nodiscard]] double number_answer(const Outcome& outcome, std::string_view answer);
[[nodiscard]] std::string text_answer(const Outcome& outcome, std::string_view answer);

[[nodiscard]] inline std::vector<double> doubles(const std::vector<std::int64_t>& values) {
    return {values.begin(), values.end()};
}

class Random {
public:
    explicit Random(std::uint64_t seed) : engine_(seed) {}
    // lowest to highest, both included
    [[nodiscard]] std::int64_t whole(std::int64_t lowest, std::int64_t highest) {
        return lowest + static_cast<std::int64_t>(engine_() % static_cast<std::uint64_t>(highest - lowest + 1));
    }
    [[nodiscard]] std::vector<std::int64_t> wholes(std::int64_t count, std::int64_t lowest, std::int64_t highest);
    [[nodiscard]] std::vector<std::int64_t> sorted(std::int64_t count, std::int64_t lowest, std::int64_t highest);
    [[nodiscard]] std::vector<double> numbers(std::int64_t count, std::int64_t lowest, std::int64_t highest);

private:
    std::mt19937_64 engine_;
};

} // namespace rankstead::test
