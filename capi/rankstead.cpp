// The inquiry calls of the C interface.
#include "rankstead.h"

#include "decimal.h"
#include "guard.h"
#include "inquiry.h"
#include "version.h"
#include "words.h"

#include <limits>
#include <type_traits>

using namespace rankstead;

static_assert(RKS_OK == static_cast<int>(Status::ok) && RKS_BLANK == static_cast<int>(Status::blank));
static_assert(RKS_BAD_CALL == static_cast<int>(Status::bad_call));
static_assert(RKS_UNKNOWN_STUDY == static_cast<int>(Status::unknown_study));
static_assert(RKS_UNKNOWN_ARGUMENT == static_cast<int>(Status::unknown_argument));
static_assert(RKS_UNKNOWN_ANSWER == static_cast<int>(Status::unknown_answer));
static_assert(RKS_UNKNOWN_SETTING == static_cast<int>(Status::unknown_setting));
static_assert(RKS_BAD_SETTING == static_cast<int>(Status::bad_setting));
static_assert(RKS_WRONG_KIND == static_cast<int>(Status::wrong_kind));
static_assert(RKS_NOT_RUN == static_cast<int>(Status::not_run));
static_assert(RKS_BAD_DATA == static_cast<int>(Status::bad_data));
static_assert(RKS_NO_DATA == static_cast<int>(Status::no_data));
static_assert(RKS_UNEQUAL_LENGTHS == static_cast<int>(Status::unequal_lengths));
static_assert(RKS_TOO_LARGE == static_cast<int>(Status::too_large));
static_assert(RKS_NO_ANSWER == static_cast<int>(Status::no_answer));
static_assert(RKS_OUT_OF_MEMORY == static_cast<int>(Status::out_of_memory));
static_assert(RKS_INTERNAL == static_cast<int>(Status::internal));

namespace {

constexpr double no_number = std::numeric_limits<double>::quiet_NaN();

// Runs one call on an inquiry and keeps the reason if it fails.
template <class Work>
rks_status call(const rks_inquiry* inquiry, Work&& work) noexcept {
    if (inquiry == nullptr) {
        return RKS_BAD_CALL;
    }
    inquiry->message.clear();
    return guarded(std::forward<Work>(work),
                   [&](const Refusal* /*refusal*/, const std::string& words) { inquiry->message = words; });
}

void require(bool condition, const char* what) {
    if (!condition) {
        throw Refusal(Status::bad_call, std::string(what) + " is a null pointer.");
    }
}

std::string_view text_or_empty(const char* text) {
    return text == nullptr ? std::string_view() : text;
}

// An answer after a failed run: the reason, as text.
std::string failure_text(const rks_inquiry& inquiry, const AnswerRow& answer) {
    const std::string& why = inquiry.failure->message;
    return std::string_view(answer.word) == "check" ? why : "Not computed: " + why;
}

std::string reading_text(const Reading& reading) {
    if (const auto* text = std::get_if<std::string>(&reading)) {
        return *text;
    }
    if (const auto* number = std::get_if<double>(&reading)) {
        return shortest_text(*number);
    }
    if (const auto* none = std::get_if<NoAnswer>(&reading)) {
        return "Not computed: " + none->reason;
    }
    return "";
}

Status reading_status(const rks_inquiry& inquiry, const Reading& reading) {
    if (const auto* none = std::get_if<NoAnswer>(&reading)) {
        inquiry.message = none->reason;
        return Status::no_answer;
    }
    return std::holds_alternative<Blank>(reading) ? Status::blank : Status::ok;
}

// One cell of a table; texts are kept in `texts`, which must have room for them.
rks_cell cell_of(const Reading& reading, std::vector<std::string>& texts) {
    rks_cell cell{RKS_CELL_BLANK, 0, 0, nullptr, 0};
    if (const auto* number = std::get_if<double>(&reading)) {
        cell.kind = RKS_CELL_NUMBER;
        cell.number = *number;
    } else if (const auto* text = std::get_if<std::string>(&reading)) {
        texts.push_back(*text);
        cell.kind = RKS_CELL_TEXT;
        cell.text = texts.back().c_str();
        cell.length = texts.back().size();
    } else if (std::holds_alternative<NoAnswer>(reading)) {
        cell.kind = RKS_CELL_STATUS;
        cell.number = RKS_NO_ANSWER;
    }
    return cell;
}

// The answer as a table, with its status; after a failed run one cell that says why.
std::pair<Status, Table> table_of(const rks_inquiry& inquiry, const AnswerRow& row) {
    if (inquiry.failure) {
        inquiry.message = inquiry.failure->message;
        return {inquiry.failure->status, Table{{failure_text(inquiry, row)}, 1}};
    }
    Reading reading = read_answer(inquiry, row);
    if (auto* table = std::get_if<Table>(&reading)) {
        return {Status::ok, std::move(*table)};
    }
    const Status status = reading_status(inquiry, reading);
    return {status, Table{{std::move(reading)}, 1}};
}

} // namespace

rks_status rks_inquiry_new(const char* study, rks_inquiry** out) {
    if (out == nullptr) {
        return RKS_BAD_CALL;
    }
    *out = nullptr;
    if (study == nullptr) {
        return RKS_BAD_CALL;
    }
    return guarded(
        [&] {
            if (!is_utf8(study)) {
                return Status::bad_call;
            }
            const StudyRow* row = find_study(study);
            if (row == nullptr) {
                return Status::unknown_study;
            }
            *out = new rks_inquiry(*row);
            return Status::ok;
        },
        [](const Refusal*, const std::string&) {});
}

void rks_inquiry_free(rks_inquiry* inquiry) {
    delete inquiry;
}

rks_status rks_inquiry_numbers(rks_inquiry* inquiry, const char* argument, const double* values, size_t rows,
                               size_t columns) {
    return call(inquiry, [&] {
        require(argument != nullptr, "argument");
        require(values != nullptr || rows == 0 || columns == 0, "values");
        lend(*inquiry, argument, {values, rows, columns});
        return Status::ok;
    });
}

rks_status rks_inquiry_cells(rks_inquiry* inquiry, const char* argument, const rks_cell* cells, size_t rows,
                             size_t columns) {
    return call(inquiry, [&] {
        require(argument != nullptr, "argument");
        require(cells != nullptr || rows == 0 || columns == 0, "cells");
        lend(*inquiry, argument, {cells, rows, columns});
        return Status::ok;
    });
}

rks_status rks_inquiry_set(rks_inquiry* inquiry, const char* setting, const char* value) {
    return call(inquiry, [&] {
        require(setting != nullptr, "setting");
        require(value != nullptr, "value");
        set_setting(*inquiry, setting, value);
        return Status::ok;
    });
}

rks_status rks_inquiry_run(rks_inquiry* inquiry) {
    return call(inquiry, [&] {
        run(*inquiry);
        return Status::ok;
    });
}

rks_status rks_inquiry_number(const rks_inquiry* inquiry, const char* answer, double* out) {
    if (out != nullptr) {
        *out = no_number;
    }
    return call(inquiry, [&] {
        require(answer != nullptr, "answer");
        require(out != nullptr, "out");
        const AnswerRow& row = answer_asked(*inquiry, answer);
        if (row.kind != AnswerKind::number) {
            throw Refusal(Status::wrong_kind, "the answer " + std::string(row.word) + " is not a number.");
        }
        if (inquiry->failure) {
            inquiry->message = inquiry->failure->message;
            return inquiry->failure->status;
        }
        const Reading reading = read_answer(*inquiry, row);
        if (const auto* number = std::get_if<double>(&reading)) {
            *out = *number;
        }
        return reading_status(*inquiry, reading);
    });
}

rks_status rks_inquiry_text(const rks_inquiry* inquiry, const char* answer, const char** out, size_t* length) {
    if (out != nullptr) {
        *out = "";
    }
    if (length != nullptr) {
        *length = 0;
    }
    return call(inquiry, [&] {
        require(out != nullptr, "out");
        const AnswerRow& row = answer_asked(*inquiry, text_or_empty(answer));
        if (row.kind == AnswerKind::table && !inquiry->failure) {
            throw Refusal(Status::wrong_kind, "the answer " + std::string(row.word) + " is a table.");
        }
        const auto [status, table] = table_of(*inquiry, row);
        rks_inquiry::HandedOut& place = place_for(*inquiry, row);
        if (!place.text) {
            place.text = reading_text(table.cells.front());
        }
        *out = place.text->c_str();
        if (length != nullptr) {
            *length = place.text->size();
        }
        return status;
    });
}

rks_status rks_inquiry_table(const rks_inquiry* inquiry, const char* answer, const rks_cell** cells, size_t* rows,
                             size_t* columns) {
    return call(inquiry, [&] {
        require(cells != nullptr, "cells");
        require(rows != nullptr && columns != nullptr, "rows or columns");
        *cells = nullptr;
        *rows = *columns = 0;
        const AnswerRow& row = answer_asked(*inquiry, text_or_empty(answer));
        const auto [status, table] = table_of(*inquiry, row);
        rks_inquiry::HandedOut& place = place_for(*inquiry, row);
        if (place.cells.empty()) {
            place.texts.reserve(table.cells.size());
            for (const Reading& reading : table.cells) {
                place.cells.push_back(cell_of(reading, place.texts));
            }
        }
        *cells = place.cells.data();
        *columns = table.columns;
        *rows = table.cells.size() / table.columns;
        return status;
    });
}

const char* rks_inquiry_message(const rks_inquiry* inquiry) {
    return inquiry == nullptr ? "" : inquiry->message.c_str();
}

rks_status rks_inquiry_where(const rks_inquiry* inquiry, const char** argument, size_t* row, size_t* column,
                             const char** reason) {
    const auto give = [](auto* target, auto value) {
        if (target != nullptr) {
            *target = value;
        }
    };
    const bool placed = inquiry != nullptr && inquiry->failure && inquiry->failure->place;
    give(argument, placed ? inquiry->failure->place->argument.c_str() : "");
    give(row, placed ? inquiry->failure->place->row : size_t{0});
    give(column, placed ? inquiry->failure->place->column : size_t{0});
    give(reason, placed ? inquiry->failure->reason.c_str() : "");
    return inquiry == nullptr ? RKS_BAD_CALL : placed ? RKS_OK : RKS_NO_ANSWER;
}

const char* rks_status_text(rks_status status) {
    return status_text(status).data();
}

uint32_t rks_abi_version(void) {
    constexpr uint32_t major = 1;
    constexpr uint32_t minor = 0;
    return major * 1000 + minor;
}

const char* rks_build(void) {
    return build_line.data();
}
