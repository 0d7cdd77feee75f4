#include "gap_scan.h"

#include "enumeration.h"

#include <algorithm>
#include <cstdlib>
#include <iterator>
#include <set>

namespace rankstead::test {

namespace {

using Values = std::vector<std::int64_t>;

// Twice the middle of each gap, in the unit of the breakpoints.
Values twice_middles(const std::set<std::int64_t>& breakpoints) {
    Values middles{2 * *breakpoints.begin() - 2};
    for (auto at = breakpoints.begin(); at != breakpoints.end(); ++at) {
        const auto next = std::next(at);
        middles.push_back(*at + (next == breakpoints.end() ? *at + 2 : *next));
    }
    return middles;
}

void add_gap(Scan& scan, const Enumerated& law, std::int64_t observed) {
    scan.total = law.total;
    scan.upper.push_back(law.at_least(observed));
    scan.lower.push_back(law.at_most(observed));
}

} // namespace

Scan scan_signed_rank(const Values& changes) {
    std::set<std::int64_t> walsh;
    for (std::size_t i = 0; i < changes.size(); ++i) {
        for (std::size_t j = i; j < changes.size(); ++j) {
            walsh.insert(changes[i] + changes[j]);
        }
    }
    Scan scan;
    for (const std::int64_t fourfold : twice_middles(walsh)) {
        Values sizes;
        for (const std::int64_t change : changes) {
            sizes.push_back(std::abs(4 * change - fourfold));
        }
        const Values ranks = doubled_midranks(sizes);
        std::int64_t observed = 0;
        for (std::size_t i = 0; i < changes.size(); ++i) {
            observed += 4 * changes[i] > fourfold ? ranks[i] : 0;
        }
        add_gap(scan, every_sign(ranks), observed);
    }
    for (const std::int64_t sum : walsh) {
        scan.breakpoints.push_back(static_cast<double>(sum) / 2);
    }
    return scan;
}

Scan scan_sign(const Values& changes) {
    const std::set<std::int64_t> values(changes.begin(), changes.end());
    const auto law = every_sign(Values(changes.size(), 1));
    Scan scan;
    for (const std::int64_t twice : twice_middles(values)) {
        add_gap(scan, law, std::count_if(changes.begin(), changes.end(), [&](auto c) { return 2 * c > twice; }));
    }
    scan.breakpoints.assign(values.begin(), values.end());
    return scan;
}

Scan scan_rank_sum(const Values& first, const Values& second) {
    std::set<std::int64_t> differences;
    for (const std::int64_t x : first) {
        for (const std::int64_t y : second) {
            differences.insert(x - y);
        }
    }
    Scan scan;
    for (const std::int64_t twice : twice_middles(differences)) {
        Values pooled;
        for (const std::int64_t x : first) {
            pooled.push_back(2 * x - twice);
        }
        for (const std::int64_t y : second) {
            pooled.push_back(2 * y);
        }
        const Values ranks = doubled_midranks(pooled);
        std::int64_t observed = 0;
        for (std::size_t i = 0; i < first.size(); ++i) {
            observed += ranks[i];
        }
        add_gap(scan, every_choice(ranks, first.size()), observed);
    }
    scan.breakpoints.assign(differences.begin(), differences.end());
    return scan;
}

bool exceeds(std::uint64_t count, std::uint64_t total, const Fraction& rate) {
    return static_cast<double>(count) * static_cast<double>(rate.denominator) >
           static_cast<double>(rate.numerator) * static_cast<double>(total);
}

ScannedLimit scanned_lower_limit(const Scan& scan, const Fraction& rate) {
    std::size_t gap = 0;
    while (!exceeds(scan.upper[gap], scan.total, rate)) {
        ++gap;
    }
    if (gap == 0) {
        return {};
    }
    return {scan.breakpoints[gap - 1], static_cast<double>(scan.upper[gap - 1]) / static_cast<double>(scan.total)};
}

ScannedLimit scanned_upper_limit(const Scan& scan, const Fraction& rate) {
    std::size_t gap = scan.breakpoints.size();
    while (!exceeds(scan.lower[gap], scan.total, rate)) {
        --gap;
    }
    if (gap == scan.breakpoints.size()) {
        return {};
    }
    return {scan.breakpoints[gap], static_cast<double>(scan.lower[gap + 1]) / static_cast<double>(scan.total)};
}

} // namespace rankstead::test
