// The rows of the answers table, in the order of a report, and how each is read from an outcome. Only catalogue.cpp
// includes this.
#pragma once

#include "catalogue.h"
#include "notes.h"
#include "version.h"
#include "wording.h"

#include <array>
#include <cmath>

namespace rankstead::rows {

inline constexpr Studies every_data_study = only(StudyId::single) | only(StudyId::pairs) | only(StudyId::groups);
inline constexpr Studies two_samples = only(StudyId::pairs) | only(StudyId::groups);

// A difference of two doubles can be beyond the largest.
inline Reading reading(double number) {
    return std::isfinite(number) ? Reading(number) : Reading(NoAnswer{"this number is too large to be written."});
}

inline Reading reading(const Figure& figure) {
    return figure.value ? reading(*figure.value) : Reading(NoAnswer{figure.reason});
}

inline Reading reading(const std::string& text) {
    return text.empty() ? Reading(Blank{}) : Reading(text);
}

template <auto Member>
Reading number(const Outcome& outcome) {
    return reading(static_cast<double>(outcome.*Member));
}

template <auto Member>
Reading figure(const Outcome& outcome) {
    return reading(outcome.*Member);
}

template <auto Sample, auto Member>
Reading described(const Outcome& outcome) {
    if constexpr (std::is_same_v<decltype(Sample), std::optional<rankstead::Sample> Outcome::*>) {
        return (outcome.*Sample)->description.*Member;
    } else {
        return (outcome.*Sample).description.*Member;
    }
}

template <auto... Members>
Reading counted(const Outcome& outcome) {
    std::size_t count = 0;
    for (const Ledger& ledger : outcome.ledgers) {
        count += ((ledger.*Members) + ...);
    }
    return static_cast<double>(count);
}

inline Reading read_z(const Outcome& outcome) {
    return outcome.z ? Reading(*outcome.z) : Reading(Blank{});
}

inline Reading read_accuracy(const Outcome& outcome) {
    if (!outcome.exact) {
        return NoAnswer{"p comes from " +
                        std::string(outcome.law == LawKind::saddlepoint ? "the saddlepoint" : "the normal") +
                        " approximation, which has no bound on its error."};
    }
    if (!std::isfinite(*outcome.relative_error)) {
        return NoAnswer{"p is below the smallest number that can be shown, so no relative error can be stated."};
    }
    return *outcome.relative_error;
}

inline Reading read_n_second(const Outcome& outcome) {
    return static_cast<double>(outcome.second->n);
}
inline Reading read_n_first(const Outcome& outcome) {
    return static_cast<double>(outcome.first.n);
}

inline Reading read_notes(const Outcome& outcome) {
    std::string text;
    for (const std::string& note : notes(outcome)) {
        text += (text.empty() ? "" : " ") + note;
    }
    return reading(text);
}

inline Reading read_check(const Outcome& outcome) {
    if (!std::isfinite(outcome.estimate)) {
        return std::string("ok, but without an estimate: it is beyond the largest number that a cell can hold.");
    }
    const std::string& reason = outcome.observations.interval_reason;
    return reason.empty() ? std::string("ok") : "ok, but without limits: " + reason;
}

inline Reading read_stamp(const Outcome& outcome) {
    const StudyRow& study = study_of(outcome);
    return "Rankstead " + std::string(version) + "; " + study.word + "; " + settings_in_force(outcome.settings, study) +
           "; data " + outcome.fingerprint;
}

inline Reading read_report(const Outcome& outcome) {
    Table table{{}, 2};
    for (const AnswerRow& row : answers()) {
        if (row.kind != AnswerKind::table && fits(row.fits, study_of(outcome))) {
            table.cells.emplace_back(std::string(row.word));
            table.cells.push_back(row.read(outcome));
        }
    }
    return table;
}

inline constexpr std::array answer_table{
    AnswerRow{"sentence", "", AnswerKind::text, "One sentence for the report: estimate, limits, p, n, test.",
              every_data_study, [](const Outcome& o) -> Reading { return sentence(o); }},
    AnswerRow{
        "estimate", "", AnswerKind::number,
        "The Hodges-Lehmann estimate: of the shift first - second, of the change after - before, or of the centre; "
        "the median under test=sign.",
        every_data_study, number<&Outcome::estimate>},
    AnswerRow{"lower", "", AnswerKind::number, "The lower confidence limit of the estimate.", every_data_study,
              figure<&Outcome::lower>},
    AnswerRow{"upper", "", AnswerKind::number, "The upper confidence limit of the estimate.", every_data_study,
              figure<&Outcome::upper>},
    AnswerRow{"confidence", "", AnswerKind::number, "The confidence level that these limits actually reach.",
              every_data_study, figure<&Outcome::confidence>},
    AnswerRow{"p", "p value", AnswerKind::number, "The p value, two-sided unless side says otherwise.",
              every_data_study, number<&Outcome::p>},
    AnswerRow{"chance", "", AnswerKind::number,
              "The chance that a value of the first group exceeds one of the second (pairs: that a change is a rise; "
              "single: that a value exceeds the reference), equality counted half.",
              every_data_study, number<&Outcome::chance>},
    AnswerRow{"chance lower", "", AnswerKind::number, "The lower confidence limit of the chance.", every_data_study,
              figure<&Outcome::chance_lower>},
    AnswerRow{"chance upper", "", AnswerKind::number, "The upper confidence limit of the chance.", every_data_study,
              figure<&Outcome::chance_upper>},
    AnswerRow{"statistic", "", AnswerKind::number,
              "T+ (signed rank), the number above (sign), or U of the first group (rank sum).", every_data_study,
              number<&Outcome::statistic>},
    AnswerRow{"z", "", AnswerKind::number, "The normal deviate; blank where the exact law was used.", every_data_study,
              read_z},
    AnswerRow{"arrangements", "", AnswerKind::text,
              "How many of all equally likely arrangements are at least this extreme; blank where they are too many to "
              "count in 63 bits.",
              every_data_study, [](const Outcome& o) { return reading(o.arrangements); }},
    AnswerRow{"method", "", AnswerKind::text, "How p was obtained.", every_data_study,
              [](const Outcome& o) -> Reading { return method_words(o) + law_words(o); }},
    AnswerRow{"accuracy", "", AnswerKind::number, "The bound on the relative error of an exact p.", every_data_study,
              read_accuracy},
    AnswerRow{"smallest p", "", AnswerKind::number,
              "The smallest two-sided p that these sizes and ties could ever give.", every_data_study,
              number<&Outcome::smallest_p>},
    AnswerRow{"n", "", AnswerKind::number, "Values used; for pairs, complete pairs.", every_data_study,
              number<&Outcome::n>},
    AnswerRow{"n first", "", AnswerKind::number, "Values used of the first group.", only(StudyId::groups),
              read_n_first},
    AnswerRow{"n second", "", AnswerKind::number, "Values used of the second group.", only(StudyId::groups),
              read_n_second},
    AnswerRow{"zeros", "", AnswerKind::number, "Changes of zero, or values equal to the tested value.",
              only(StudyId::single) | only(StudyId::pairs), number<&Outcome::zeros>},
    AnswerRow{"tied", "", AnswerKind::number, "Ranked values that share their rank with another.", every_data_study,
              number<&Outcome::tied>},
    AnswerRow{"missing", "", AnswerKind::number, "Cells without a value: blank, or holding a word for missing.",
              every_data_study, counted<&Ledger::blank, &Ledger::missing_words>},
    AnswerRow{"censored", "", AnswerKind::number, "Cells with a value beyond a limit, such as <0.5.", every_data_study,
              counted<&Ledger::censored>},
    AnswerRow{"median first", "median", AnswerKind::number, "The median of the first group, before, or the values.",
              every_data_study, described<&Outcome::first, &Description::median>},
    AnswerRow{"lower quartile first", "", AnswerKind::number, "Its lower quartile, as the spreadsheet's QUARTILE.",
              every_data_study, described<&Outcome::first, &Description::lower_quartile>},
    AnswerRow{"upper quartile first", "", AnswerKind::number, "Its upper quartile, as the spreadsheet's QUARTILE.",
              every_data_study, described<&Outcome::first, &Description::upper_quartile>},
    AnswerRow{"median second", "", AnswerKind::number, "The median of the second group, or after.", two_samples,
              described<&Outcome::second, &Description::median>},
    AnswerRow{"lower quartile second", "", AnswerKind::number, "Its lower quartile, as the spreadsheet's QUARTILE.",
              two_samples, described<&Outcome::second, &Description::lower_quartile>},
    AnswerRow{"upper quartile second", "", AnswerKind::number, "Its upper quartile, as the spreadsheet's QUARTILE.",
              two_samples, described<&Outcome::second, &Description::upper_quartile>},
    AnswerRow{"notes", "", AnswerKind::text, "Warnings in plain words; blank when there are none.", every_data_study,
              read_notes},
    AnswerRow{"ledger", "", AnswerKind::text,
              "Where every cell went: seen = used + blank + text + censored + unpaired.", every_data_study,
              [](const Outcome& o) -> Reading { return ledger_words(o); }},
    AnswerRow{"check", "", AnswerKind::text, "ok, or in plain words why nothing could be computed.", every_data_study,
              read_check},
    AnswerRow{"methods", "", AnswerKind::text, "One sentence for a methods section, with the version.",
              every_data_study, [](const Outcome& o) -> Reading { return methods_sentence(o); }},
    AnswerRow{"stamp", "", AnswerKind::text,
              "Version, settings in force and a fingerprint of the data: equal stamps, equal results.",
              every_data_study, read_stamp},
    AnswerRow{"report", "", AnswerKind::table, "All answers, two columns, for entry as an array formula.",
              every_data_study, read_report},
    AnswerRow{"build", "", AnswerKind::text, "Version and build of Rankstead.", only(StudyId::build),
              [](const Outcome&) -> Reading { return std::string(build_line); }},
};

} // namespace rankstead::rows
