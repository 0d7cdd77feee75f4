// e^(i t r) of every score r, at t = 2 pi j / points for one row j after the other.
#pragma once

#include "contour_parts.h"

#include <cstddef>
#include <cstdint>
#include <vector>

namespace rankstead {

class GroupPhases {
public:
    // The scores must outlive this.
    GroupPhases(const std::vector<std::int64_t>& scores, std::int64_t points) : scores_(scores), points_(points) {}

    // From a row shortly before by rotations, renewed exactly every so often: each phase is then off by fewer than
    // `roundings` units of roundoff.
    void go_to(std::int64_t j);

    static constexpr double roundings = 60;
    static constexpr std::size_t many = 200; // scores from which on exact angles would take longer than all else

    [[nodiscard]] const std::vector<double>& re() const { return re_; }
    [[nodiscard]] const std::vector<double>& im() const { return im_; }

private:
    void renew();
    void rotate();

    const std::vector<std::int64_t>& scores_;
    std::int64_t points_;
    std::int64_t row_ = -1;
    int rotations_ = 0;
    std::vector<double> re_;
    std::vector<double> im_;
    std::vector<double> step_re_; // by one row; only among many scores
    std::vector<double> step_im_;
};

} // namespace rankstead
