#include "common.h"
#include "fingerprint.h"
#include "one_sample.h"
#include "studies.h"

namespace rankstead {

namespace {

template <class Int>
Sample described(const Column& column, std::string name, const Grid& grid) {
    std::vector<Int> sorted = on_grid<Int>(column.values, grid);
    std::sort(sorted.begin(), sorted.end());
    return {std::move(name), sorted.size(), describe(sorted, grid)};
}

// after - before, exact, ascending.
template <class Int>
std::vector<Int> changes(PairedColumns&& pairs, const Grid& grid) {
    std::vector<Int> result = moved_on_grid<Int>(std::move(pairs.second.values), grid);
    Scale<Int> scale(grid);
    for (std::size_t i = 0; i < result.size(); ++i) {
        result[i] -= scale.of(pairs.first.values[i]);
    }
    std::vector<Decimal>().swap(pairs.first.values);
    std::sort(result.begin(), result.end());
    return result;
}

} // namespace

Outcome run_pairs(const Arguments& arguments, const Settings& settings) {
    PairedColumns pairs = read_pairs(*arguments[0], *arguments[1], settings);
    Outcome outcome;
    outcome.study = StudyId::pairs;
    outcome.settings = settings;
    outcome.ledgers = {pairs.first.ledger, pairs.second.ledger};
    outcome.observations.equal_at_fifteen_digits = pairs.equal_at_fifteen_digits;
    outcome.fingerprint = Fingerprint().add(pairs.first).add(pairs.second).text();
    Grid grid;
    grid.cover(pairs.first.values);
    grid.cover(pairs.second.values);
    grid.cover(settings.margin);
    require_practicable(grid, 2 * pairs.first.values.size());
    with_integers(grid, [&]<class Int>() {
        outcome.first =
            described<Int>(pairs.first, chosen_name(settings.first_name, pairs.first.heading, "before"), grid);
        outcome.second =
            described<Int>(pairs.second, chosen_name(settings.second_name, pairs.second.heading, "after"), grid);
        analyse_one_sample(outcome, OneSample<Int>{changes<Int>(std::move(pairs), grid), Int(0),
                                                   on_grid<Int>(settings.margin, grid), grid});
    });
    return outcome;
}

} // namespace rankstead
