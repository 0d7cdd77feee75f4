#include "group_phases.h"

namespace rankstead {

namespace {

constexpr int most_rotations = 16; // each adds sqrt(5) roundings and what the step itself is off

} // namespace

void GroupPhases::go_to(std::int64_t j) {
    const std::int64_t steps = j - row_;
    if (steps == 0) {
        return;
    }
    const bool near = row_ >= 0 && steps > 0 && steps + rotations_ <= most_rotations && scores_.size() >= many;
    row_ = j;
    if (!near) {
        renew();
        return;
    }
    for (std::int64_t step = 0; step < steps; ++step) {
        rotate();
    }
}

void GroupPhases::renew() {
    rotations_ = 0;
    re_.resize(scores_.size());
    im_.resize(scores_.size());
    for (std::size_t g = 0; g < scores_.size(); ++g) {
        const Complex phase = exact_unit(row_, scores_[g], points_);
        re_[g] = phase.real();
        im_[g] = phase.imag();
    }
}

void GroupPhases::rotate() {
    if (step_re_.empty()) {
        for (const std::int64_t score : scores_) {
            const Complex step = exact_unit(1, score, points_);
            step_re_.push_back(step.real());
            step_im_.push_back(step.imag());
        }
    }
    ++rotations_;
    for (std::size_t g = 0; g < re_.size(); ++g) {
        const double re = re_[g] * step_re_[g] - im_[g] * step_im_[g];
        im_[g] = re_[g] * step_im_[g] + im_[g] * step_re_[g];
        re_[g] = re;
    }
}

} // namespace rankstead
