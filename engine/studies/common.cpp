#include "common.h"

#include "../wording.h"

namespace rankstead {

void take_tails(Outcome& outcome, const Tails& tails) {
    outcome.law = tails.law;
    outcome.exact = is_exact(tails.law);
    outcome.observations.exact_wanted_but_too_long = !outcome.exact;
    outcome.observations.approximation_error = outcome.exact ? 0 : tails.relative_error;
    outcome.p = p_value(tails, outcome.settings.side);
    outcome.relative_error = tails.relative_error;
    if (tails.counts) {
        const NumberWriter writer(outcome.settings.decimal_sign);
        outcome.arrangements =
            writer.count(p_count(tails, outcome.settings.side)) + " of " + writer.count(tails.counts->total);
    }
}

void take_approximate(Outcome& outcome, const Moments& moments) {
    outcome.exact = false;
    outcome.law = LawKind::normal;
    outcome.p = normal_p(outcome.statistic, moments, outcome.settings.side);
    outcome.z = normal_deviate(outcome.statistic, moments, outcome.settings.side);
}

void take_laws(Outcome& outcome, const GapLaws& laws) {
    Observations& seen = outcome.observations;
    seen.limits_approximate = laws.error() > 0;
    seen.approximation_error = std::max(seen.approximation_error, laws.error());
}

std::string chosen_name(const std::string& setting, const std::string& heading, const std::string& otherwise) {
    return !setting.empty() ? setting : !heading.empty() ? heading : otherwise;
}

std::string no_limits_reason(const Settings& settings, double smallest_tail) {
    const NumberWriter writer(settings.decimal_sign);
    const double attainable = 1 - (settings.side == Side::two_sided ? 2 : 1) * smallest_tail;
    return "no finite " + writer.percent(settings.level.to_double()) +
           " interval exists with so few values; the highest level that these sizes can reach is " +
           writer.percent(std::max(0.0, attainable)) + ".";
}

void take_chance(Outcome& outcome, double chance, const std::optional<Interval>& interval, const std::string& reason) {
    const Side side = outcome.settings.side;
    const std::string other_side = "with side=" + std::string(side == Side::higher ? "higher" : "lower") +
                                   " the interval has only its other limit.";
    const auto figure = [&](bool wanted, double Interval::*end) {
        return !wanted ? Figure::none(other_side) : interval ? Figure::of(*interval.*end) : Figure::none(reason);
    };
    outcome.chance = chance;
    outcome.chance_lower = figure(side != Side::lower, &Interval::lower);
    outcome.chance_upper = figure(side != Side::higher, &Interval::upper);
}

} // namespace rankstead
