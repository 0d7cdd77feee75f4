#include "common.h"
#include "fingerprint.h"
#include "one_sample.h"
#include "studies.h"

namespace rankstead {

Outcome run_single(const Arguments& arguments, const Settings& settings) {
    Column values = read_column(*arguments[0], settings);
    const Decimal reference = read_number(*arguments[1], settings);
    Outcome outcome;
    outcome.study = StudyId::single;
    outcome.settings = settings;
    outcome.ledgers = {values.ledger};
    outcome.reference = reference.to_double();
    outcome.fingerprint = Fingerprint().add(values).add(reference).text();
    Grid grid;
    grid.cover(values.values);
    grid.cover(reference);
    grid.cover(settings.margin);
    require_practicable(grid, values.values.size());
    with_integers(grid, [&]<class Int>() {
        OneSample<Int> sample{moved_on_grid<Int>(std::move(values.values), grid), on_grid<Int>(reference, grid), Int(0),
                              grid};
        std::sort(sample.sorted.begin(), sample.sorted.end());
        sample.origin = sample.reference + on_grid<Int>(settings.margin, grid);
        outcome.first = {chosen_name(settings.first_name, values.heading, "values"), sample.sorted.size(),
                         describe(sample.sorted, grid)};
        analyse_one_sample(outcome, sample);
    });
    return outcome;
}

} // namespace rankstead
