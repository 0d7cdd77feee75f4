// The state behind the opaque handle of the C interface.
#pragma once

#include "catalogue.h"
#include "rankstead.h"
#include "refusal.h"

#include <memory>
#include <optional>
#include <string>
#include <variant>
#include <vector>

namespace rankstead {

// Data as the caller holds them, borrowed until run returns.
struct Borrowed {
    std::variant<std::monostate, const double*, const rks_cell*> data;
    std::size_t rows = 0;
    std::size_t columns = 0;
};

// Where and why the last run failed.
struct Failure {
    Status status = Status::ok;
    std::string message;
    std::string reason;
    std::optional<Place> place;
};

} // namespace rankstead

struct rks_inquiry {
    explicit rks_inquiry(const rankstead::StudyRow& row) : study(&row), arguments(row.arguments.size()) {}

    const rankstead::StudyRow* study;
    rankstead::Settings settings;
    std::vector<rankstead::Borrowed> arguments; // in the order of the study's arguments

    std::shared_ptr<const rankstead::Outcome> outcome; // null until run, and after a failure
    std::optional<rankstead::Failure> failure;         // of the last run

    // Texts and tables handed out, by answer, kept until the next run. Reading an answer does not change the inquiry,
    // but it has to put the text somewhere.
    struct HandedOut {
        std::optional<std::string> text; // once handed out, never touched
        std::vector<std::string> texts;
        std::vector<rks_cell> cells;
    };
    mutable std::vector<std::unique_ptr<HandedOut>> handed_out;
    mutable std::string message;
};

namespace rankstead {

// The steps behind the calls; each may throw Refusal.
void lend(rks_inquiry& inquiry, std::string_view argument, const Borrowed& data);
void set_setting(rks_inquiry& inquiry, std::string_view setting, std::string_view value);
void run(rks_inquiry& inquiry);

// The answer, read; throws Refusal for an unknown one or before the run.
[[nodiscard]] const AnswerRow& answer_asked(const rks_inquiry& inquiry, std::string_view answer);
[[nodiscard]] Reading read_answer(const rks_inquiry& inquiry, const AnswerRow& answer);

// The place for what an answer hands out; the same until the next run.
[[nodiscard]] rks_inquiry::HandedOut& place_for(const rks_inquiry& inquiry, const AnswerRow& answer);

} // namespace rankstead
