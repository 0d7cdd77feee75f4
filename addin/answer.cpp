#include "answer.h"

#include "asked.h"
#include "cell_error.h"
#include "convert.h"

#include <rankstead.h>

#include <algorithm>
#include <memory>
#include <optional>
#include <string>
#include <vector>

namespace rankstead::calc {

using com::sun::star::uno::Any;

namespace {

struct Release {
    void operator()(rks_inquiry* inquiry) const { rks_inquiry_free(inquiry); }
};
using Inquiry = std::unique_ptr<rks_inquiry, Release>;

// ------------------------------------------------------------------------------------------------ what is given

// A reference to one blank cell arrives as the number 0, which is never a setting.
bool no_settings(const Range& range) {
    double number = 1;
    return range.filled_rows() == 0 ||
           (range.rows() == 1 && range.columns() == 1 && (range.at(0, 0) >>= number) && number == 0.0);
}

rks_status give(rks_inquiry* inquiry, const char* word, const Cells& cells) {
    return rks_inquiry_cells(inquiry, word, cells.data(), cells.rows(), cells.columns());
}

rks_status give_settings(rks_inquiry* inquiry, const Range& range) {
    return no_settings(range) ? RKS_OK : give(inquiry, "settings", Cells(range, range.filled_rows()));
}

// A helper takes no settings.
Range settings_of(std::size_t study, const Arguments& arguments) {
    const bool helper = rks_study_form(study) == RKS_FORM_HELPER;
    return helper ? Range(Any()) : argument(arguments, rks_argument_count(study) + 1);
}

std::vector<Range> data_of(std::size_t study, const Arguments& arguments) {
    std::vector<Range> data;
    for (std::size_t i = 0; i < rks_argument_count(study); ++i)
        data.push_back(argument(arguments, i));
    return data;
}

// Rows beyond the last one that holds anything in any argument are left away, so that whole columns can be given and
// are cheap. All arguments keep the same rows: a pair with one value missing at the end stays a pair.
std::vector<Cells> trimmed(const std::vector<Range>& data) {
    std::size_t last = 0;
    for (const Range& range : data)
        last = std::max(last, range.filled_rows());
    std::vector<Cells> cells;
    for (const Range& range : data)
        cells.emplace_back(range, std::min(range.rows(), last));
    return cells;
}

// The cells are borrowed by the inquiry until it has run.
rks_status give_data(rks_inquiry* inquiry, std::size_t study, const std::vector<Range>& data,
                     const std::vector<Cells>& cells) {
    rks_status status = RKS_OK;
    for (std::size_t i = 0; i < data.size() && status == RKS_OK; ++i)
        if (data[i].given())
            status = give(inquiry, rks_argument_word(study, i), cells[i]);
    return status;
}

// ------------------------------------------------------------------------------------------------ what is shown

Any show_number(const rks_inquiry* inquiry, const std::string& word) {
    double number = 0;
    const rks_status status = rks_inquiry_number(inquiry, word.c_str(), &number);
    if (status == RKS_BLANK)
        return to_calc("", 0);
    return status == RKS_OK ? to_calc(number) : error_cell(cell_error_for(status));
}

// After a failure the text says why, so it is shown all the same.
Any show_text(const rks_inquiry* inquiry, const std::string& word) {
    const char* text = nullptr;
    std::size_t length = 0;
    const rks_status status = rks_inquiry_text(inquiry, word.c_str(), &text, &length);
    if (text == nullptr || (length == 0 && status != RKS_OK && status != RKS_BLANK))
        return error_cell(cell_error_for(status));
    return to_calc(text, length);
}

Any show_table(const rks_inquiry* inquiry, const std::string& word) {
    const rks_cell* cells = nullptr;
    std::size_t rows = 0;
    std::size_t columns = 0;
    const rks_status status = rks_inquiry_table(inquiry, word.c_str(), &cells, &rows, &columns);
    if (status == RKS_OK && rows > 0 && columns > 0)
        return to_calc(cells, rows, columns);
    return show_text(inquiry, word);
}

Any show(const rks_inquiry* inquiry, const Asked& asked) {
    switch (asked.kind) {
    case RKS_ANSWER_NUMBER:
        return show_number(inquiry, asked.word);
    case RKS_ANSWER_TABLE:
        return show_table(inquiry, asked.word);
    default:
        return show_text(inquiry, asked.word);
    }
}

// What could not even be given to the inquiry: settings that do not exist, above all.
Any show_refusal(const rks_inquiry* inquiry, const Asked& asked, rks_status status) {
    if (asked.kind == RKS_ANSWER_NUMBER)
        return error_cell(cell_error_for(status));
    const std::string text = std::string("Not computed: ") + rks_inquiry_message(inquiry);
    return to_calc(text.data(), text.size());
}

Inquiry opened(std::size_t study) {
    rks_inquiry* inquiry = nullptr;
    rks_inquiry_new(rks_study_word(study), &inquiry);
    return Inquiry(inquiry);
}

} // namespace

Any answer(std::size_t study, const Arguments& arguments) {
    const std::optional<Asked> asked = what_is_asked(study, arguments);
    if (!asked)
        return error_cell(CellError::invalid_argument);
    const Inquiry inquiry = opened(study);
    if (!inquiry)
        return error_cell(CellError::no_value);
    const std::vector<Range> data = data_of(study, arguments);
    const std::vector<Cells> cells = trimmed(data);
    rks_status status = give_settings(inquiry.get(), settings_of(study, arguments));
    if (status == RKS_OK)
        status = give_data(inquiry.get(), study, data, cells);
    if (status != RKS_OK)
        return show_refusal(inquiry.get(), *asked, status);
    rks_inquiry_run(inquiry.get()); // a failure is told again by every answer
    return show(inquiry.get(), *asked);
}

} // namespace rankstead::calc
