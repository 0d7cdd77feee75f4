// Seeded random data with ties, for property tests. Values are whole multiples of a tenth, so that every shift, margin
// and middle of a gap is an exact short decimal.
#ifndef RANKSTEAD_TESTS_CAPI_SUPPORT_RANDOM_DATA_H
#define RANKSTEAD_TESTS_CAPI_SUPPORT_RANDOM_DATA_H

#include <cstddef>
#include <cstdint>
#include <random>
#include <string>
#include <vector>

namespace rks_test {

using Tenths = std::vector<std::int64_t>;

class RandomData {
public:
    explicit RandomData(std::uint64_t seed) : source_(seed) {}

    /// A whole number from low to high.
    std::int64_t between(std::int64_t low, std::int64_t high);
    /// Values with few levels, so with many ties.
    Tenths tied(std::size_t size);
    /// Values whose differences, and whose Walsh averages, are all distinct: powers of two with random signs.
    Tenths untied(std::size_t size);
    void shuffle(Tenths& values);

    template <class Word>
    const Word& one_of(const std::vector<Word>& words) {
        return words[static_cast<std::size_t>(between(0, static_cast<std::int64_t>(words.size()) - 1))];
    }

private:
    std::mt19937_64 source_; // the only generator whose numbers the standard fixes; no distributions
};

inline constexpr std::size_t million = 1000000;

/// Seeded values of 0 to `levels` tenths, moved by `shift` tenths.
std::vector<double> random_tenths(std::uint64_t seed, std::size_t size, std::int64_t levels, std::int64_t shift = 0);

/// As the doubles that the decimals round to.
std::vector<double> doubles(const Tenths& tenths);

/// `units` of size 1/per_one as an exact decimal, per_one being 10, 20 or 40: decimal_text(7, 20) is "0.35".
std::string decimal_text(std::int64_t units, std::int64_t per_one);

} // namespace rks_test

#endif
