#include "report_json.h"

#include <cmath>

namespace rankstead::client {
namespace {

Json cell_json(const rks_cell& cell) {
    if (cell.kind == RKS_CELL_NUMBER) {
        return json_number(cell.number);
    }
    return cell.kind == RKS_CELL_TEXT ? Json(std::string(cell_text(cell))) : Json(nullptr);
}

Json table_json(const AnswerTable& table) {
    if (table.status != RKS_OK) {
        return nullptr;
    }
    Json rows = Json::array();
    for (std::size_t row = 0; row < table.rows; ++row) {
        Json cells = Json::array();
        for (std::size_t column = 0; column < table.columns; ++column) {
            cells.push_back(cell_json(table.at(row, column)));
        }
        rows.push_back(std::move(cells));
    }
    return rows;
}

Json number_json(const Inquiry& inquiry, const Answer& answer) {
    const AnswerNumber number = inquiry.number(answer.word);
    return number.status == RKS_OK ? json_number(number.number) : Json(nullptr);
}

Json text_json(const Inquiry& inquiry, const Answer& answer) {
    const AnswerText text = inquiry.text(answer.word);
    return text.status == RKS_OK ? Json(text.text) : Json(nullptr);
}

Json answer_json(const Inquiry& inquiry, const Answer& answer) {
    if (answer.kind == RKS_ANSWER_TABLE) {
        return table_json(inquiry.table(answer.word));
    }
    return answer.kind == RKS_ANSWER_NUMBER ? number_json(inquiry, answer) : text_json(inquiry, answer);
}

// Why an answer does not exist, empty where it does or is blank.
std::string reason(const Inquiry& inquiry, const Answer& answer) {
    const AnswerText text = inquiry.text(answer.word);
    return text.status == RKS_NO_ANSWER ? answer.word + ": " + text.text : "";
}

} // namespace

JsonReport json_report(const Inquiry& inquiry, const Study& study, const std::vector<Answer>& answers,
                       const std::vector<std::string>& messages) {
    JsonReport report{Json::object(), {}};
    Json all_messages = messages;
    Json values = Json::object();
    for (const Answer& answer : answers) {
        values[answer.word] = answer_json(inquiry, answer);
        if (std::string why = reason(inquiry, answer); !why.empty()) {
            report.reasons.push_back(std::move(why));
        }
    }
    for (const std::string& why : report.reasons) {
        all_messages.push_back(why);
    }
    report.object = {{"build", rks_build()},
                     {"study", study.word},
                     {"answers", std::move(values)},
                     {"messages", std::move(all_messages)},
                     {"caution", rks_caution_line()}};
    return report;
}

Json json_number(double number) {
    constexpr double exact_integers = 9007199254740992.0; // 2^53
    if (std::trunc(number) == number && std::fabs(number) < exact_integers) {
        return static_cast<std::int64_t>(number);
    }
    return number;
}

std::string json_text(const Json& json) {
    return json.dump(2, ' ', false, Json::error_handler_t::replace) + '\n';
}

} // namespace rankstead::client
