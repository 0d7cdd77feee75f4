// One inquiry of the library, released when it goes out of scope.
#pragma once

#include "rankstead.h"

#include <memory>
#include <string>
#include <string_view>
#include <vector>

namespace rankstead::client {

// A text answer, or a number as text, with what became of it.
struct AnswerText {
    rks_status status;
    std::string text; // for a status that is an error: "Not computed: " and the reason
};

struct AnswerNumber {
    rks_status status;
    double number;
};

// Empty where the status is an error.
struct AnswerTable {
    rks_status status;
    const rks_cell* cells;
    std::size_t rows, columns;

    const rks_cell& at(std::size_t row, std::size_t column) const { return cells[row * columns + column]; }
};

// The cell that a run failed on.
struct Place {
    std::string argument, reason;
    std::size_t row; // inside the argument, from 1; 0 if the run did not fail on a cell
};

class Inquiry {
public:
    explicit Inquiry(const std::string& study);

    rks_status set(const std::string& setting, const std::string& value);
    // Keeps the cells, which the library borrows; their texts have to live until run returns.
    rks_status give(const std::string& argument, std::vector<rks_cell> cells);
    rks_status run();

    std::string message() const;
    Place place() const;

    AnswerText text(const std::string& answer) const;
    AnswerNumber number(const std::string& answer) const;
    AnswerTable table(const std::string& answer) const;

private:
    struct Release {
        void operator()(rks_inquiry* inquiry) const { rks_inquiry_free(inquiry); }
    };
    std::vector<std::vector<rks_cell>> cells_;
    std::unique_ptr<rks_inquiry, Release> handle_;
};

// What a cell of text holds.
std::string_view cell_text(const rks_cell& cell);

// Whether the library refuses arguments of different lengths for this study, which it does where a row is one subject.
bool goes_row_by_row(const std::string& study, const std::vector<std::string>& arguments);

} // namespace rankstead::client
