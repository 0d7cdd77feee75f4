#include "inquiry.h"

#include "failure.h"

namespace rankstead::client {

Inquiry::Inquiry(const std::string& study) {
    rks_inquiry* handle = nullptr;
    const rks_status status = rks_inquiry_new(study.c_str(), &handle);
    handle_.reset(handle);
    if (status != RKS_OK) {
        throw Failure(exit_for(status), study + ": " + rks_status_text(status));
    }
}

rks_status Inquiry::set(const std::string& setting, const std::string& value) {
    return rks_inquiry_set(handle_.get(), setting.c_str(), value.c_str());
}

rks_status Inquiry::give(const std::string& argument, std::vector<rks_cell> cells) {
    const std::vector<rks_cell>& kept = cells_.emplace_back(std::move(cells));
    return rks_inquiry_cells(handle_.get(), argument.c_str(), kept.data(), kept.size(), 1);
}

rks_status Inquiry::run() {
    return rks_inquiry_run(handle_.get());
}

std::string Inquiry::message() const {
    return rks_inquiry_message(handle_.get());
}

Place Inquiry::place() const {
    const char *argument = "", *reason = "";
    std::size_t row = 0;
    const bool known = rks_inquiry_where(handle_.get(), &argument, &row, nullptr, &reason) == RKS_OK;
    return known ? Place{argument, reason, row} : Place{"", "", 0};
}

AnswerText Inquiry::text(const std::string& answer) const {
    const char* text = "";
    std::size_t length = 0;
    const rks_status status = rks_inquiry_text(handle_.get(), answer.c_str(), &text, &length);
    return {status, text == nullptr ? std::string() : std::string(text, length)};
}

AnswerNumber Inquiry::number(const std::string& answer) const {
    double number = 0;
    const rks_status status = rks_inquiry_number(handle_.get(), answer.c_str(), &number);
    return {status, number};
}

AnswerTable Inquiry::table(const std::string& answer) const {
    AnswerTable table{RKS_OK, nullptr, 0, 0};
    table.status = rks_inquiry_table(handle_.get(), answer.c_str(), &table.cells, &table.rows, &table.columns);
    return table;
}

std::string_view cell_text(const rks_cell& cell) {
    return cell.kind == RKS_CELL_TEXT ? std::string_view(cell.text, cell.length) : std::string_view();
}

bool goes_row_by_row(const std::string& study, const std::vector<std::string>& arguments) {
    Inquiry inquiry(study);
    for (std::size_t i = 0; i < arguments.size(); ++i) {
        inquiry.give(arguments[i], std::vector<rks_cell>(i + 1, {RKS_CELL_NUMBER, 0, 1.0, nullptr, 0}));
    }
    return inquiry.run() == RKS_UNEQUAL_LENGTHS;
}

} // namespace rankstead::client
