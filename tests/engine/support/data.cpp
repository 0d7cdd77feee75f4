#include "data.h"

#include "catalogue.h"
#include "studies/studies.h"

#include <algorithm>
#include <utility>

namespace rankstead::test {

Block column(std::string argument, const std::vector<double>& numbers) {
    std::vector<Cell> list;
    for (const double value : numbers) {
        list.push_back(Cell::of(value));
    }
    return cells(std::move(argument), std::move(list));
}

Block cells(std::string argument, std::vector<Cell> list) {
    const std::size_t rows = list.size();
    return {std::move(argument), std::move(list), rows, 1};
}

Settings with(std::string_view study, std::string_view settings) {
    Settings result;
    apply_settings_block(result, *find_study(study), cells("settings", {Cell::of(settings)}));
    return result;
}

Outcome single(const std::vector<double>& values, double reference, std::string_view settings) {
    const Block data = column("values", values);
    const Block target = column("reference", {reference});
    return run_single({&data, &target}, with("single", settings));
}

Outcome changes(const std::vector<double>& changes, std::string_view settings) {
    const Block before = column("before", std::vector<double>(changes.size(), 0.0));
    const Block after = column("after", changes);
    return run_pairs({&before, &after}, with("pairs", settings));
}

Outcome groups(const std::vector<double>& first, const std::vector<double>& second, std::string_view settings) {
    const Block one = column("first", first);
    const Block other = column("second", second);
    return run_groups({&one, &other}, with("groups", settings));
}

double number_answer(const Outcome& outcome, std::string_view answer) {
    return std::get<double>(answer_of(study_of(outcome), answer).read(outcome));
}

std::string text_answer(const Outcome& outcome, std::string_view answer) {
    const Reading reading = answer_of(study_of(outcome), answer).read(outcome);
    return std::holds_alternative<Blank>(reading) ? "" : std::get<std::string>(reading);
}

std::vector<std::int64_t> Random::wholes(std::int64_t count, std::int64_t lowest, std::int64_t highest) {
    std::vector<std::int64_t> result;
    for (std::int64_t i = 0; i < count; ++i) {
        result.push_back(whole(lowest, highest));
    }
    return result;
}

std::vector<std::int64_t> Random::sorted(std::int64_t count, std::int64_t lowest, std::int64_t highest) {
    std::vector<std::int64_t> result = wholes(count, lowest, highest);
    std::sort(result.begin(), result.end());
    return result;
}

std::vector<double> Random::numbers(std::int64_t count, std::int64_t lowest, std::int64_t highest) {
    return doubles(wholes(count, lowest, highest));
}

} // namespace rankstead::test
