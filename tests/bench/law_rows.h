// The rows of the table of goals that give one p: ranked data in, both tails out.
#pragma once

#include "exact_tails.h"

#include "laws/tails.h"

#include <functional>
#include <optional>
#include <string>
#include <vector>

namespace rankstead::bench {

struct LawRow {
    std::string what;
    double goal = 0;                 // seconds
    std::function<Tails()> tails;    // what is timed; throws LawTooLong
    std::optional<ExactTails> exact; // none where it would take more memory than there is
};

[[nodiscard]] std::vector<LawRow> signed_rank_rows();
[[nodiscard]] std::vector<LawRow> rank_sum_rows();

// Both of the above.
[[nodiscard]] std::vector<LawRow> law_rows();

} // namespace rankstead::bench
