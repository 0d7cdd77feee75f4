#include "power_sums.h"

#include <boost/math/special_functions/zeta.hpp>

#include <cmath>
#include <numbers>

namespace rankstead {

namespace {

constexpr std::int64_t few = 40; // so many items are summed one by one

// Euler-Maclaurin for the sum of i^e over low < i <= high, divided by N^e:
//     N (b^(e+1) - a^(e+1)) / (e + 1) + (b^e - a^e) / 2 + sum over j of B[2j] / (2j)! e! / (e - 2j + 1)! N^(1-2j)
//     (b^(e-2j+1) - a^(e-2j+1)),      a = low / N, b = high / N.
// `difference[r]` is b^r - a^r. The terms after the second fall fast, as e is small against 2 pi times the numbers.
double by_euler_maclaurin(double n, int e, const std::vector<double>& difference) {
    constexpr double negligible = 1e-20;
    const auto at = [&](int r) { return difference[static_cast<std::size_t>(r)]; };
    double sum = n * at(e + 1) / (e + 1) + at(e) / 2;
    double factor = 2; // 2 (-1)^(j+1) e! / (e - 2j + 1)! / ((2 pi)^(2j) N^(2j-1)), without zeta(2j)
    for (int j = 1; 2 * j - 1 <= e; ++j) {
        factor *= j == 1 ? e / (4 * std::numbers::pi * std::numbers::pi * n)
                         : -static_cast<double>(e - 2 * j + 3) * (e - 2 * j + 2) /
                               (4 * std::numbers::pi * std::numbers::pi * n * n);
        const double term = factor * even_zeta()[static_cast<std::size_t>(j)] * at(e - 2 * j + 1);
        sum += term;
        if (std::fabs(term) <= negligible * std::fabs(sum)) {
            break;
        }
    }
    return sum;
}

// 1 - q^r for r = 0 to `last`, from 1 - q, so that nothing cancels.
std::vector<double> complements_of_powers(double q, double complement, int last) {
    std::vector<double> result{0};
    double power = 1;
    for (int r = 1; r <= last; ++r) {
        result.push_back(result.back() + power * complement);
        power *= q;
    }
    return result;
}

std::vector<double> powers(double q, int last) {
    std::vector<double> result{0}; // in a sum from 1 on the difference of the zeroth powers is 0
    double power = 1;
    for (int r = 1; r <= last; ++r) {
        power *= q;
        result.push_back(power);
    }
    return result;
}

// Adds sign * (i / scale)^(2k) for all k.
void add_powers(std::vector<double>& sums, double x, double sign) {
    double power = sign;
    for (double& sum : sums) {
        power *= x * x;
        sum += power;
    }
}

} // namespace

const std::vector<double>& even_zeta() {
    static const std::vector<double> table = [] {
        constexpr int last = 100;
        std::vector<double> zeta{0};
        for (int k = 1; k <= last; ++k) {
            zeta.push_back(boost::math::zeta(2.0 * k));
        }
        return zeta;
    }();
    return table;
}

std::vector<double> even_power_sums(std::int64_t n, int terms) {
    std::vector<double> sums(static_cast<std::size_t>(terms), 0.0);
    const auto size = static_cast<double>(n);
    if (n <= few) {
        for (std::int64_t i = 1; i <= n; ++i) {
            add_powers(sums, static_cast<double>(i) / size, 1);
        }
        return sums;
    }
    std::vector<double> ones(static_cast<std::size_t>(2 * terms + 2), 1.0);
    ones[0] = 0;
    for (int k = 1; k <= terms; ++k) {
        sums[static_cast<std::size_t>(k - 1)] = by_euler_maclaurin(size, 2 * k, ones);
    }
    return sums;
}

std::vector<double> even_power_differences(std::int64_t m, std::int64_t n, int terms) {
    std::vector<double> sums(static_cast<std::size_t>(terms), 0.0);
    const auto all = static_cast<double>(m + n);
    if (m <= few) {
        for (std::int64_t i = 1; i <= m; ++i) {
            add_powers(sums, static_cast<double>(n + i) / all, 1);
            add_powers(sums, static_cast<double>(i) / all, -1);
        }
        return sums;
    }
    const double share = static_cast<double>(m) / all;
    const auto upper = complements_of_powers(static_cast<double>(n) / all, share, 2 * terms + 1);
    const auto lower = powers(share, 2 * terms + 1);
    for (int k = 1; k <= terms; ++k) {
        sums[static_cast<std::size_t>(k - 1)] =
            by_euler_maclaurin(all, 2 * k, upper) - by_euler_maclaurin(all, 2 * k, lower);
    }
    return sums;
}

} // namespace rankstead
