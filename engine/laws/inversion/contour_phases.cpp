#include "contour_phases.h"

namespace rankstead {

namespace {

constexpr double seconds_per_rotation = 6e-9;

} // namespace

ContourPhases::ContourPhases(const Contour& contour)
    : contour_(contour), groups_(contour.law().items().scores, contour.lattice.sum_points) {
    const ContourLattice& lattice = contour.lattice;
    for (std::int64_t k = lattice.first_count(); k <= lattice.last_count(); ++k) {
        turns_.push_back(exact_unit(k, 1, lattice.count_points));
        count_phases_.push_back(std::conj(exact_unit(k, contour.tail.chosen(), lattice.count_points)));
    }
}

Complex ContourPhases::turned_back(std::int64_t j) const {
    const ScoredItems& items = contour_.law().items();
    return contour_.tail.count_is_fixed()
               ? std::conj(exact_unit(j, items.sum(), items.size() * contour_.lattice.sum_points))
               : 1;
}

Complex ContourPhases::turned_forth(std::int64_t j) const {
    const ScoredItems& items = contour_.law().items();
    return contour_.tail.count_is_fixed() ? exact_unit(j, static_cast<Wide>(items.sum()) * contour_.tail.chosen(),
                                                       items.size() * contour_.lattice.sum_points)
                                          : 1;
}

Complex ContourPhases::sum_phase(std::int64_t j) const {
    return std::conj(exact_unit(j, contour_.tail.w(), contour_.lattice.sum_points));
}

const GroupPhases& ContourPhases::groups_at(std::int64_t j) {
    groups_.go_to(j);
    return groups_;
}

double ContourPhases::seconds_per_row() const {
    const std::size_t groups = contour_.law().offsets().size();
    return static_cast<double>(groups) * (groups < GroupPhases::many ? seconds_per_angle : seconds_per_rotation);
}

} // namespace rankstead
