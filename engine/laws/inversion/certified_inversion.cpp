#include "certified_inversion.h"

#include "contour_sum.h"
#include "counted_work.h"
#include "frequency_decay.h"
#include "product_rows.h"
#include "series_row.h"

#include <algorithm>
#include <cmath>
#include <utility>

namespace rankstead {

namespace {

// Walks the rows of a contour: passes over those that are certain not to matter and sums the others.
class RowWalk {
public:
    RowWalk(const Contour& contour, const std::vector<double>& weights, CountedWork& work)
        : contour_(contour), work_(work), phases_(contour), decay_(contour, weights, phases_, work),
          sum_(contour.tilt.lambda) {}

    // Adds the rows of a range, which comes after those before; false where the work passes what is allowed.
    bool add(const FrequencyRange& range) {
        const double step = contour_.lattice.sum_angle(1);
        const auto first = static_cast<std::int64_t>(std::ceil(range.low / step - 1e-9));
        const auto last =
            std::min(contour_.lattice.sum_points / 2, static_cast<std::int64_t>(std::floor(range.high / step + 1e-9)));
        for (std::int64_t j = std::max(first, next_row_); j <= last;) {
            j += add_row(j);
            if (work_.is_too_much()) {
                return false;
            }
        }
        next_row_ = std::max(next_row_, last + 1);
        return true;
    }

    [[nodiscard]] std::optional<CertifiedTail> result() const {
        const SoughtTail& tail = contour_.tail;
        const ContourTilt& tilt = contour_.tilt;
        return sum_.result({tilt.lambda, tail.distance(), tilt.jet.value, tilt.jet.error, tail.log_count()},
                           contour_.lattice, contour_.need);
    }

private:
    // Adds row j and says how many rows to go on by.
    std::int64_t add_row(std::int64_t j) {
        const std::optional<FrequencyDecay::Look> look = decay_.look_at(j);
        if (look && look->proven_step > 0) {
            return 1 + contour_.lattice.rows_within(look->proven_step);
        }
        decay_.find_points(j, look, points_);
        if (!points_.empty()) {
            const RowSum row = row_sum(j);
            const double multiple = j == 0 || 2 * j == contour_.lattice.sum_points ? 1 : 2;
            sum_.add(contour_.lattice.sum_angle(j), multiple, row.value, row.rounding,
                     static_cast<std::int64_t>(points_.size()));
        }
        return 1;
    }

    RowSum row_sum(std::int64_t j) {
        if (series_serves(contour_, j, points_)) {
            work_.add(series_row_seconds(points_.size()));
            return series_row(contour_, j, points_);
        }
        if (!products_) {
            products_.emplace(contour_, phases_);
        }
        work_.add(products_->seconds(points_.size()));
        return products_->at(j, points_);
    }

    const Contour& contour_;
    CountedWork& work_;
    ContourPhases phases_;
    FrequencyDecay decay_;
    std::optional<ProductRows> products_; // made when first needed
    std::vector<std::int64_t> points_;
    std::int64_t next_row_ = 0;
    ContourSum sum_;
};

std::optional<CertifiedTail> summed(const Contour& contour, double seconds_allowed) {
    const std::vector<double> weights = contour.law().tilted_weights(contour.tilt.a, -contour.tilt.lambda);
    const Screened screened =
        frequencies_that_matter(contour.law().items().scores, weights, contour.need, seconds_allowed);
    CountedWork work(seconds_allowed);
    work.add(screened.seconds);
    RowWalk walk(contour, weights, work);
    const bool within = std::all_of(screened.ranges.begin(), screened.ranges.end(),
                                    [&](const FrequencyRange& range) { return walk.add(range); });
    return within ? walk.result() : std::nullopt;
}

} // namespace

CertifiedInversion::CertifiedInversion(ScoredItems items, double p, Count count, std::int64_t chosen)
    : characteristic_(std::move(items), p, count == Count::fixed), count_(count), chosen_(chosen) {}

CertifiedInversion CertifiedInversion::of_signs(ScoredItems items) {
    return {std::move(items), 0.5, Count::free, 0};
}

CertifiedInversion CertifiedInversion::of_choice(ScoredItems items, std::int64_t chosen) {
    const double p = static_cast<double>(chosen) / static_cast<double>(items.size());
    return {std::move(items), p, Count::fixed, chosen};
}

std::optional<CertifiedTail> CertifiedInversion::at(std::int64_t w, double seconds_allowed) const {
    const SoughtTail tail(characteristic_, count_, chosen_, w);
    if (!(tail.variance() > 0)) {
        return std::nullopt;
    }
    const ContourTilt tilt = find_tilt(tail);
    if (log_chernoff_bound(tail, tilt) < log_smallest) {
        return CertifiedTail{}; // below the range of a double
    }
    if (!is_sound(tail, tilt)) {
        return std::nullopt;
    }
    const ContourLattice lattice = choose_lattice(tail, tilt);
    if (!(lattice.alias_bound <= expected_value(tail, tilt))) {
        return std::nullopt;
    }
    const Need need{-std::log(negligible(tail, tilt)), tilt.lambda};
    return summed({tail, tilt, lattice, need}, seconds_allowed);
}

} // namespace rankstead
