// How far beyond a frequency t it is certain that no phase s can matter. With tilted weights w_g and their transform
// C(t) = sum of w_g e^(itr_g), the decay at any s is at least V - |C(t)| (see frequency_screen.h), and that, of all
// groups, of a part of them, or summed over blocks of neighbouring ones, falls no faster than the weighted distances
// from the middle.
#pragma once

#include "group_phases.h"

#include <cstddef>
#include <vector>

namespace rankstead {

// Every so-manieth group, where there are very many: a part of them proves as well, if it proves enough.
class PartOfGroups {
public:
    // A part with ample weight for a need of about `need`.
    PartOfGroups(const std::vector<double>& offsets, const std::vector<double>& weights, double need);

    // 0 where it proves nothing.
    [[nodiscard]] double proven_step(double t, double need) const;
    [[nodiscard]] std::size_t size() const { return weights_.size(); }

private:
    std::vector<double> offsets_;
    std::vector<double> weights_;
    double total_ = 0;
    double slope_ = 0;
};

// All groups, in blocks of neighbouring ones.
class BlocksOfGroups {
public:
    // The weights must outlive this.
    BlocksOfGroups(const std::vector<double>& offsets, const std::vector<double>& weights);

    struct Look {
        Complex transform; // C(t)
        double proven_step = 0;
    };
    // The transform from the phases of the groups, all of which `back` turns.
    [[nodiscard]] Look look(const GroupPhases& phases, Complex back, double need) const;
    [[nodiscard]] double total_weight() const { return total_; }

private:
    struct Block {
        std::size_t end = 0; // past its last group
        double weight = 0;
    };

    const std::vector<double>& weights_;
    std::vector<Block> blocks_;
    double total_ = 0;
    double whole_slope_ = 0;
    double block_slope_ = 0;
};

} // namespace rankstead
