#include "notes.h"

#include "outcome.h"
#include "wording.h"

#include <algorithm>
#include <array>
#include <cmath>

namespace rankstead {

namespace {

constexpr double small_p = 0.05;

using Note = std::string (*)(const Outcome&); // empty where it does not apply

NumberWriter writer(const Outcome& outcome) {
    return NumberWriter(outcome.settings.decimal_sign);
}

std::string counted(std::size_t count, const char* one, const char* many) {
    return std::to_string(count) + " " + (count == 1 ? one : many);
}

bool is_groups(const Outcome& outcome) {
    return outcome.study == StudyId::groups;
}

bool is_signed_rank(const Outcome& outcome) {
    return !is_groups(outcome) && outcome.settings.test == Test::signed_rank;
}

const char* differences(const Outcome& outcome) {
    return outcome.study == StudyId::pairs ? "changes" : "values";
}

std::string left_out(const Outcome& outcome) {
    std::string words;
    for (const Ledger& ledger : outcome.ledgers) {
        std::vector<std::string> parts;
        if (ledger.blank > 0) {
            parts.push_back(counted(ledger.blank, "blank cell", "blank cells"));
        }
        if (ledger.missing_words > 0) {
            parts.push_back(
                counted(ledger.missing_words, "cell with a word for missing", "cells with a word for missing"));
        }
        if (ledger.unpaired > 0) {
            parts.push_back(counted(ledger.unpaired, "value without a partner", "values without a partner"));
        }
        std::string list;
        for (const std::string& part : parts) {
            list += (list.empty() ? "" : ", ") + part;
        }
        words += list.empty() ? "" : (words.empty() ? "" : "; ") + ledger.argument + " " + list;
    }
    return words.empty() ? ""
                         : "Left out: " + words + ". Check that they are missing for reasons unrelated to the result.";
}

std::string all_equal(const Outcome& outcome) {
    const bool unchanged = !is_groups(outcome) && outcome.zeros == outcome.n;
    if (unchanged && outcome.study == StudyId::pairs) {
        return "No pair changed, so there is nothing to test: p is 1.";
    }
    if (unchanged) {
        return "Every value equals the tested value, so there is nothing to test: p is 1.";
    }
    if (outcome.observations.all_tied) {
        return std::string("All values are equal") +
               (outcome.settings.margin == Decimal{} ? "" : " once the margin is taken off") +
               ", so the groups cannot be told apart: p is 1.";
    }
    return "";
}

std::string too_few(const Outcome& outcome) {
    if (outcome.smallest_p <= small_p || !all_equal(outcome).empty()) {
        return "";
    }
    return "So few values can never give a p below " +
           writer(outcome).number(std::round(outcome.smallest_p * 1e4) / 1e4) +
           ", whatever they are. Collect more before concluding anything.";
}

std::string no_limits(const Outcome& outcome) {
    const std::string& reason = outcome.observations.interval_reason;
    return reason.empty() ? "" : "Limits: " + reason + " Ask for a lower level, or collect more.";
}

std::string too_long(const Outcome& outcome) {
    const Observations& seen = outcome.observations;
    if (!seen.exact_wanted_but_too_long && !seen.limits_approximate) {
        return "";
    }
    const NumberWriter writer(outcome.settings.decimal_sign);
    const bool close = seen.approximation_error < 0.5;
    return "The exact law of so many values would take too long, so " +
           std::string(seen.exact_wanted_but_too_long ? "p and the limits come" : "the limits come, unlike p,") +
           " from the saddlepoint approximation. " +
           (close ? "Wherever it was compared with the exact p, it was within " +
                        writer.percent(std::max(seen.approximation_error, 0.0001)) + " of it for p above 0.0001."
                  : "With so few values in the smaller group, or on so few different ones, it may be off by a factor "
                    "of two or three.");
}

std::string asked_for_approximation(const Outcome& outcome) {
    return outcome.settings.method == Method::approximate
               ? "The normal approximation was asked for. It can be far off with few values or many ties; leave the "
                 "setting method out for the exact p."
               : "";
}

std::string zeros(const Outcome& outcome) {
    if (is_groups(outcome) || outcome.zeros == 0 || outcome.zeros == outcome.n) {
        return "";
    }
    const std::string what =
        outcome.study == StudyId::pairs
            ? counted(outcome.zeros, "pair did not change", "pairs did not change")
            : counted(outcome.zeros, "value equals the tested value", "values equal the tested value");
    const bool one = outcome.zeros == 1;
    const std::string they = one ? "it was" : "they were";
    const std::string rule = outcome.settings.test == Test::sign
                                 ? "the sign test sets " + std::string(one ? "it" : "them") + " aside"
                             : outcome.settings.zeros == Zeros::drop ? they +
                                                                           " dropped before ranking (zeros=drop); "
                                                                           "zeros=pratt ranks " +
                                                                           std::string(one ? "it" : "them") + " first"
                                                                     : they + " ranked and then set aside "
                                                                              "(zeros=pratt)";
    const bool many = 2 * outcome.zeros >= outcome.n;
    return what + ": " + rule + "." +
           (many ? " That is half of them or more, so p speaks of the minority that changed: report the count too."
                 : "");
}

std::string heavy_ties(const Outcome& outcome) {
    const std::size_t used = is_groups(outcome) ? outcome.n : outcome.n - outcome.zeros;
    if (used < 5 || 2 * outcome.tied <= used || !all_equal(outcome).empty() ||
        (!is_groups(outcome) && outcome.settings.test == Test::sign)) {
        return "";
    }
    return std::to_string(outcome.tied) + " of " + std::to_string(used) + " " +
           (is_groups(outcome) ? "values" : differences(outcome)) + " are tied. " +
           (outcome.exact ? "The exact p allows for that; " : "The approximation corrects for that; ") +
           "the estimate and its limits can only be as fine as the measurement.";
}

std::string equal_medians(const Outcome& outcome) {
    if (!outcome.second || outcome.p >= small_p ||
        outcome.first.description.median != outcome.second->description.median) {
        return "";
    }
    return "The two medians are equal although p is small: the test compares whole sets of values, not their medians. "
           "Report the estimate and the chance instead.";
}

std::string zero_estimate(const Outcome& outcome) {
    if (outcome.study == StudyId::single || outcome.p >= small_p || outcome.estimate != 0) {
        return "";
    }
    return "The estimate is 0 although p is small, because many values are equal: the direction shows in the chance, "
           "so report that.";
}

std::string lopsided(const Outcome& outcome) {
    if (!is_signed_rank(outcome) || !outcome.observations.lopsided) {
        return "";
    }
    return std::string("The ") + differences(outcome) +
           " are lopsided. The signed rank test expects them to spread about evenly to both sides of their centre; "
           "test=sign does not.";
}

std::string different_spreads(const Outcome& outcome) {
    return outcome.observations.spreads_differ
               ? "One group is spread much wider than the other, so a single shift does not describe the difference "
                 "well, and a small p may come from the spread. Show a picture and report the chance."
               : "";
}

std::string exceptional_margins(const Outcome& outcome) {
    const auto& margins = outcome.observations.exceptional_margins;
    if (margins.empty()) {
        return "";
    }
    std::string list;
    for (const double margin : margins) {
        list += (list.empty() ? "" : ", ") + writer(outcome).number(margin);
    }
    return "With zeros=drop, p and the limits disagree at exactly " + list +
           ", because a value there becomes a zero and is dropped. zeros=pratt has no such exception.";
}

std::string closed_table(const Outcome& outcome) {
    const bool tied = outcome.tied > 0 || outcome.zeros > 0;
    return outcome.settings.interval == IntervalRule::table && tied
               ? "interval=table gives the classical closed interval, made for data without ties: its limits can "
                 "contradict p. interval=matching cannot."
               : "";
}

std::string rounding(const Outcome& outcome) {
    const std::size_t count = outcome.observations.equal_at_fifteen_digits;
    return count == 0 ? ""
                      : counted(count, "pair differs", "pairs differ") + " only beyond the 15th digit and " +
                            (count == 1 ? "was" : "were") + " taken as equal.";
}

constexpr std::array<Note, 15> all_notes{
    left_out,   all_equal,     too_few,       no_limits, too_long,          asked_for_approximation, zeros,
    heavy_ties, equal_medians, zero_estimate, lopsided,  different_spreads, exceptional_margins,     closed_table,
    rounding};

} // namespace

std::vector<std::string> notes(const Outcome& outcome) {
    std::vector<std::string> result;
    for (const Note note : all_notes) {
        std::string words = note(outcome);
        if (!words.empty()) {
            result.push_back(std::move(words));
        }
    }
    return result;
}

} // namespace rankstead
