#include "study_command.h"

#include "asking.h"
#include "long_layout.h"
#include "report_json.h"
#include "report_text.h"
#include "request.h"
#include "study_options.h"
#include "words.h"

#include <algorithm>

namespace rankstead::client {
namespace {

// Long only where the study has that layout: elsewhere --values may be the name of an argument.
Selection selection(const Request& asked, const Table& table) {
    const bool row_by_row = goes_row_by_row(asked.study.word, words_of(asked.study.arguments));
    const bool by_label = asked.names.long_layout && asks_for_long_layout(asked.line);
    Selection selected = by_label ? select_by_label(table, asked.names, asked.line, row_by_row)
                                  : select_columns(table, asked.names, asked.line);
    begin_with_numbers(selected.data, row_by_row, decimal_sign_of(asked.names, asked.line));
    return selected;
}

Selection selection_from_file(const Request& asked, std::istream& standard_input) {
    if (!asked.takes_file()) {
        return {};
    }
    refuse_no_data_option(asked);
    const char separator = separator_from(asked.line.one("separator").value_or(","));
    return selection(asked, read_table(asked.line.rest().front(), separator, standard_input));
}

// What --json holds: the answers asked for, or all but the tables, which repeat the others.
std::vector<Answer> answers_for_json(const Request& asked) {
    if (!asked.answers.empty()) {
        return asked.answers;
    }
    std::vector<Answer> all = answers_of(asked.study);
    std::erase_if(all, [](const Answer& answer) { return answer.kind == RKS_ANSWER_TABLE; });
    return all;
}

void print_json(const Request& asked, const Inquiry& inquiry, const std::vector<std::string>& messages,
                std::vector<std::string>& reasons, std::ostream& out) {
    JsonReport report = json_report(inquiry, asked.study, answers_for_json(asked), messages);
    out << json_text(report.object);
    if (!asked.answers.empty()) {
        reasons = std::move(report.reasons);
    }
}

void print_answers(const Request& asked, const Inquiry& inquiry, std::vector<std::string>& reasons, std::ostream& out) {
    for (const Answer& answer : asked.answers) {
        if (std::string reason = print_answer(inquiry, answer, out); !reason.empty()) {
            reasons.push_back(std::move(reason));
        }
    }
}

void tell(const std::vector<std::string>& messages, std::ostream& err) {
    for (const std::string& message : messages) {
        err << "rankstead: " << message << '\n';
    }
}

// Prints what was asked for. An answer that was asked for by name and does not exist is a failure.
Exit report(const Request& asked, const Inquiry& inquiry, const std::vector<std::string>& notes,
            const Console& console) {
    std::vector<std::string> reasons;
    if (asked.line.has("json")) {
        print_json(asked, inquiry, notes, reasons, console.out);
    } else if (asked.answers.empty()) {
        print_report(inquiry, asked.study, notes, console.out);
    } else {
        print_answers(asked, inquiry, reasons, console.out);
        tell(notes, console.err);
    }
    tell(reasons, console.err);
    return reasons.empty() ? Exit::done : Exit::data;
}

std::string source_of(const Request& asked) {
    const bool standard = asked.takes_file() && asked.line.rest().front() == "-";
    return standard ? standard_input_name : asked.takes_file() ? asked.line.rest().front() : asked.study.word;
}

// Prints the JSON object of a failed run, where one is asked for.
Failure failure_of(const Request& asked, const Inquiry& inquiry, rks_status status, const std::vector<Series>& data,
                   std::ostream& out) {
    Failure failure = run_failure(inquiry, status, source_of(asked), asked.names, data);
    std::vector<std::string> reasons;
    if (asked.line.has("json")) {
        print_json(asked, inquiry, {failure.what()}, reasons, out);
    }
    return failure;
}

Exit answer(const Request& asked, const Console& console) {
    refuse_wrong_files(asked);
    Inquiry inquiry(asked.study.word);
    give_settings(inquiry, asked.names, asked.line);
    const Selection selected = selection_from_file(asked, console.in);
    give_settings_of_file(inquiry, asked.names, asked.line, selected.data);
    give_data(inquiry, selected.data);
    if (const rks_status status = inquiry.run(); status != RKS_OK) {
        throw failure_of(asked, inquiry, status, selected.data, console.out);
    }
    return report(asked, inquiry, selected.notes, console);
}

} // namespace

Exit run_study(const Study& study, const std::vector<std::string>& arguments, const Console& console) {
    const Request asked = request_for(study, arguments);
    if (!asked.line.has("help")) {
        return answer(asked, console);
    }
    console.out << study_help(study, asked.names);
    return Exit::done;
}

} // namespace rankstead::client
