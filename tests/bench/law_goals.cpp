#include "benchmarks.h"
#include "law_rows.h"

namespace rankstead::bench {

void register_law_goals() {
    for (const LawRow& row : law_rows()) {
        register_goal(row.what, row.goal, [tails = row.tails](benchmark::State& state) { time_law(state, tails); });
    }
}

} // namespace rankstead::bench
