// Exact tails of the rank statistics without ties, at any size and, but for the far corners, at a cost that does not
// depend on it: the inversion of certified_inversion.h in one dimension, with the closed forms of untied_law.h.
#pragma once

#include "certified_inversion.h"
#include "untied_law.h"

#include <cstdint>
#include <optional>

namespace rankstead {

class UntiedInversion {
public:
    // T+ of n differences, n from 1 to 2e9.
    static UntiedInversion of_signed_rank(std::int64_t n) { return UntiedInversion(UntiedLaw::signed_rank(n)); }
    // U of m against n values, m n below 2^62.
    static UntiedInversion of_rank_sum(std::int64_t m, std::int64_t n) {
        return UntiedInversion(UntiedLaw::rank_sum(m, n));
    }

    // Both at w, 0 <= w <= highest / 2. Empty where no useful bound can be given within the work allowed. A tail below
    // the range of a double is 0.
    [[nodiscard]] std::optional<CertifiedTail> at(std::int64_t w, double seconds_allowed) const;

    [[nodiscard]] const UntiedLaw& law() const { return law_; }

private:
    explicit UntiedInversion(UntiedLaw law) : law_(std::move(law)) {}

    UntiedLaw law_;
};

} // namespace rankstead
