// What a study found: everything that an answer can be read from.
#pragma once

#include "estimates/chance.h"
#include "estimates/description.h"
#include "intake.h"
#include "laws/tails.h"
#include "settings.h"

#include <cstdint>
#include <optional>
#include <string>
#include <vector>

namespace rankstead {

enum class StudyId { single, pairs, groups, build };

// A number, or in words why there is none.
struct Figure {
    std::optional<double> value;
    std::string reason;

    static Figure of(double number) { return {number, {}}; }
    static Figure none(std::string why) { return {std::nullopt, std::move(why)}; }
};

struct Sample {
    std::string name;
    std::size_t n = 0;
    Description description;
};

// What the notes look at besides the answers themselves.
struct Observations {
    bool exact_wanted_but_too_long = false; // p comes from the saddlepoint approximation
    bool limits_approximate = false;        // a law that the limits needed did
    double approximation_error = 0;         // the relative error to expect of it
    bool lopsided = false;       // differences far from symmetric, where the signed rank test expects symmetry
    bool spreads_differ = false; // interquartile ranges of two groups
    bool all_tied = false;       // every value of both groups, the margin taken off, is the same
    std::size_t equal_at_fifteen_digits = 0;
    std::vector<double> exceptional_margins; // zeros=drop: margins where p and the limits disagree
    std::string interval_reason;             // why there are no limits
};

struct Outcome {
    StudyId study = StudyId::single;
    Settings settings;
    std::vector<Ledger> ledgers;
    Sample first;
    std::optional<Sample> second;
    double reference = 0; // single only

    std::size_t n = 0; // values, pairs or both groups together
    std::size_t zeros = 0;
    std::size_t tied = 0;

    double statistic = 0;
    double p = 1;
    std::optional<double> z;
    bool exact = true;
    LawKind law = LawKind::counted;       // how p was found
    std::optional<double> relative_error; // of p, where exact
    std::string arrangements;             // "43 of 1,024", empty where the counts do not fit
    double smallest_p = 1;

    double estimate = 0;
    Figure lower;
    Figure upper;
    Figure confidence;
    double chance = 0.5;
    Figure chance_lower;
    Figure chance_upper;

    Observations observations;
    std::string fingerprint;
};

} // namespace rankstead
