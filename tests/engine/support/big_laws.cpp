#include "big_laws.h"

#include <algorithm>
#include <cmath>
#include <numeric>
#include <stdexcept>

namespace rankstead::test {

namespace {

using Fixed256 = boost::multiprecision::uint256_t;
__extension__ typedef unsigned __int128 Fixed128;

template <class Count>
BigTails tails_of(const std::vector<Count>& ways, std::int64_t sum) {
    BigTails tails;
    for (std::size_t s = 0; s < ways.size(); ++s) {
        const Big count(ways[s]);
        tails.total += count;
        tails.lower += static_cast<std::int64_t>(s) <= sum ? count : Big(0);
        tails.upper += static_cast<std::int64_t>(s) >= sum ? count : Big(0);
    }
    return tails;
}

std::size_t sum_of(const std::vector<std::int64_t>& scores) {
    return static_cast<std::size_t>(std::accumulate(scores.begin(), scores.end(), std::int64_t{0}));
}

} // namespace

BigTails big_sign_tails(const std::vector<std::int64_t>& scores, std::int64_t sum) {
    if (scores.size() > 250) {
        throw std::length_error("2^n would not fit 256 bits");
    }
    std::vector<Fixed256> ways(sum_of(scores) + 1);
    ways[0] = 1;
    for (const std::int64_t score : scores) {
        const auto step = static_cast<std::size_t>(score);
        for (std::size_t s = ways.size() - 1; s >= step; --s) {
            ways[s] += ways[s - step];
        }
    }
    return tails_of(ways, sum);
}

// ways[c][s]: choices of c of the scores so far with sum s.
BigTails big_choice_tails(const std::vector<std::int64_t>& scores, std::size_t m, std::int64_t sum) {
    if (big_choose(scores.size(), m) >> 127 != 0) {
        throw std::length_error("C(N, m) would not fit 127 bits");
    }
    if (2 * m > scores.size()) {
        // The law of those left behind, upside down.
        const auto all = static_cast<std::int64_t>(sum_of(scores));
        const BigTails rest = big_choice_tails(scores, scores.size() - m, all - sum);
        return {rest.upper, rest.lower, rest.total};
    }
    std::vector<std::int64_t> largest(scores);
    std::sort(largest.rbegin(), largest.rend());
    largest.resize(m);
    const std::size_t width = sum_of(largest) + 1;
    std::vector<std::vector<Fixed128>> ways(m + 1, std::vector<Fixed128>(width, 0));
    ways[0][0] = 1;
    for (const std::int64_t score : scores) {
        const auto step = static_cast<std::size_t>(score);
        for (std::size_t c = m; c >= 1; --c) {
            for (std::size_t s = step; s < width; ++s) {
                ways[c][s] += ways[c - 1][s - step];
            }
        }
    }
    return tails_of(ways[m], sum);
}

Big big_choose(std::size_t n, std::size_t k) {
    Big result = 1;
    for (std::size_t i = 1; i <= k; ++i) {
        result = result * (n - k + i) / i;
    }
    return result;
}

double relative_error(double value, const Big& numerator, const Big& denominator) {
    const long double exact = numerator.convert_to<long double>() / denominator.convert_to<long double>();
    return static_cast<double>(std::fabs(static_cast<long double>(value) - exact) / exact);
}

} // namespace rankstead::test
