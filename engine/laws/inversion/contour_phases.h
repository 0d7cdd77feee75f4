// The phases of a contour's frequencies (s, t), with angles that are reduced exactly: e^(is) of every point of a row,
// and e^(itr) of every group, one row after the other.
#pragma once

#include "contour.h"
#include "group_phases.h"

#include <cstddef>
#include <cstdint>
#include <vector>

namespace rankstead {

class ContourPhases {
public:
    // The contour must outlive this.
    explicit ContourPhases(const Contour& contour);

    // e^(is) and e^(-ism) at the k-th of the s.
    [[nodiscard]] Complex turn_of(std::int64_t k) const { return turns_[index_of(k)]; }
    [[nodiscard]] Complex count_phase_of(std::int64_t k) const { return count_phases_[index_of(k)]; }

    // The scores are taken as they are, but s belongs to scores about their mean: what turns back by t times the mean,
    // for one item; and what undoes it for all that are chosen.
    [[nodiscard]] Complex turned_back(std::int64_t j) const;
    [[nodiscard]] Complex turned_forth(std::int64_t j) const;
    // e^(-itw).
    [[nodiscard]] Complex sum_phase(std::int64_t j) const;

    // The phases e^(itr) of row j, and the work of it.
    const GroupPhases& groups_at(std::int64_t j);
    [[nodiscard]] double seconds_per_row() const;

    static constexpr double seconds_per_angle = 60e-9;

private:
    [[nodiscard]] std::size_t index_of(std::int64_t k) const {
        return static_cast<std::size_t>(k - contour_.lattice.first_count());
    }

    const Contour& contour_;
    std::vector<Complex> turns_;
    std::vector<Complex> count_phases_;
    GroupPhases groups_;
};

} // namespace rankstead
