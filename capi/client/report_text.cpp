#include "report_text.h"

#include "aligned.h"
#include "words.h"

namespace rankstead::client {
namespace {

constexpr std::size_t page_width = 100;

std::string shown(const rks_cell& cell) {
    if (cell.kind == RKS_CELL_NUMBER) {
        return shortest(cell.number);
    }
    return std::string(cell_text(cell));
}

// The value beside a label; where no number can be given, the reason.
std::string value_of(const Inquiry& inquiry, const std::string& label, const rks_cell& cell) {
    return cell.kind == RKS_CELL_STATUS ? inquiry.text(label).text : shown(cell);
}

// A table of two columns holds answer words and their values.
std::vector<Line> lines_of(const Inquiry& inquiry, const AnswerTable& table) {
    std::vector<Line> lines;
    for (std::size_t row = 0; row < table.rows; ++row) {
        const std::string label = shown(table.at(row, 0));
        lines.emplace_back(label, table.columns < 2 ? "" : value_of(inquiry, label, table.at(row, 1)));
    }
    return lines;
}

} // namespace

void print_report(const Inquiry& inquiry, const Study& study, const std::vector<std::string>& notes,
                  std::ostream& out) {
    const std::optional<Answer> report = report_of(study);
    if (!report) {
        out << inquiry.text(study.default_answer).text << '\n';
        return;
    }
    std::vector<Line> lines = lines_of(inquiry, inquiry.table(report->word));
    for (const std::string& note : notes) {
        lines.emplace_back("file", note);
    }
    print_aligned(lines, page_width, out);
    out << '\n' << rks_caution_line() << '\n';
}

std::string print_answer(const Inquiry& inquiry, const Answer& answer, std::ostream& out) {
    if (answer.kind == RKS_ANSWER_TABLE) {
        print_aligned(lines_of(inquiry, inquiry.table(answer.word)), page_width, out);
        return "";
    }
    const AnswerText text = inquiry.text(answer.word);
    const bool given = text.status == RKS_OK || text.status == RKS_BLANK;
    out << (given ? text.text : "") << '\n';
    return given ? "" : answer.word + ": " + text.text;
}

} // namespace rankstead::client
