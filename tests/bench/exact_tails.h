// The same tails in whole numbers, so that the error of a row is measured and not only bounded: by the recursions of
// tests/accuracy, with the work they take foreseen.
#pragma once

#include "big_laws.h"

#include "laws/rank_sum_law.h"
#include "laws/signed_rank_law.h"

#include <functional>

namespace rankstead::bench {

struct ExactTails {
    double work = 0; // additions of words, roughly
    std::function<test::BigTails()> tails;
};

[[nodiscard]] ExactTails exact_tails(const SignScores& scores);
[[nodiscard]] ExactTails exact_tails(const ChoiceScores& scores);

} // namespace rankstead::bench
