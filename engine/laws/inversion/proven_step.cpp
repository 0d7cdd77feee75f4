#include "proven_step.h"

#include <algorithm>
#include <cmath>
#include <numeric>

namespace rankstead {

PartOfGroups::PartOfGroups(const std::vector<double>& offsets, const std::vector<double>& weights, double need) {
    constexpr double ample = 20;
    const double total = std::accumulate(weights.begin(), weights.end(), 0.0);
    const auto stride = static_cast<std::size_t>(std::max(1.0, total / (ample * need)));
    const double middle = (offsets.front() + offsets.back()) / 2;
    for (std::size_t g = 0; g < offsets.size(); g += stride) {
        offsets_.push_back(offsets[g]);
        weights_.push_back(weights[g]);
        total_ += weights[g];
        slope_ += weights[g] * std::fabs(offsets[g] - middle);
    }
}

double PartOfGroups::proven_step(double t, double need) const {
    Complex sum = 0;
    for (std::size_t g = 0; g < weights_.size(); ++g) {
        sum += weights_[g] * unit(t * offsets_[g]);
    }
    const double spare = total_ * (1 - 1e-6) - std::sqrt(std::norm(sum)) - need;
    return slope_ > 0 ? std::max(0.0, spare / slope_) : 0;
}

BlocksOfGroups::BlocksOfGroups(const std::vector<double>& offsets, const std::vector<double>& weights)
    : weights_(weights) {
    constexpr double block_range = 64;
    const double middle = (offsets.front() + offsets.back()) / 2;
    for (std::size_t g = 0; g < offsets.size();) {
        const double first = offsets[g];
        Block block;
        for (; g < offsets.size() && offsets[g] - first <= block_range; ++g) {
            block.weight += weights[g];
            whole_slope_ += weights[g] * std::fabs(offsets[g] - middle);
        }
        block.end = g;
        block_slope_ += block.weight * (offsets[g - 1] - first) / 2;
        total_ += block.weight;
        blocks_.push_back(block);
    }
}

BlocksOfGroups::Look BlocksOfGroups::look(const GroupPhases& phases, Complex back, double need) const {
    Look look;
    double block_decay = 0;
    std::size_t g = 0;
    for (const Block& block : blocks_) {
        double re = 0;
        double im = 0;
        for (; g < block.end; ++g) {
            re += weights_[g] * phases.re()[g];
            im += weights_[g] * phases.im()[g];
        }
        block_decay += block.weight - std::sqrt(re * re + im * im);
        look.transform += Complex(re, im);
    }
    look.transform = times(look.transform, back);
    const double allowance = need + 1e-9 * total_; // and for the rounding of the sums
    const auto step = [&](double decay, double slope) {
        return slope > 0 && decay > allowance ? (decay - allowance) / slope : 0.0;
    };
    look.proven_step = std::max(step(total_ - std::abs(look.transform), whole_slope_), step(block_decay, block_slope_));
    return look;
}

} // namespace rankstead
