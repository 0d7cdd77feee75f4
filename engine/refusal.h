// Why something cannot be done: a status number, a reason in words and, for a cell, its place.
#pragma once

#include <cstddef>
#include <cstdint>
#include <exception>
#include <optional>
#include <string>
#include <string_view>
#include <utility>

namespace rankstead {

// The numbers are those of the public header; the C layer asserts it.
enum class Status : std::int32_t {
    ok = 0,
    blank = 1,
    bad_call = 10,
    unknown_study = 11,
    unknown_argument = 12,
    unknown_answer = 13,
    unknown_setting = 14,
    bad_setting = 15,
    wrong_kind = 16,
    not_run = 17,
    bad_data = 30,
    no_data = 31,
    unequal_lengths = 32,
    too_large = 33,
    no_answer = 50,
    out_of_memory = 70,
    internal = 71,
};

// One sentence for a status; for a number that is no status, a sentence that says so.
[[nodiscard]] std::string_view status_text(std::int32_t status) noexcept;

// A cell inside an argument, rows and columns counted from 1. `columns` is the width of the argument.
struct Place {
    std::string argument;
    std::size_t row = 0;
    std::size_t column = 0;
    std::size_t columns = 1;
};

// "after, row 7" or, in a block, "after, row 7, column 2".
[[nodiscard]] std::string in_words(const Place& place);

class Refusal : public std::exception {
public:
    Refusal(Status status, std::string reason) : status_(status), reason_(std::move(reason)), message_(reason_) {}
    Refusal(Status status, std::string reason, Place place)
        : status_(status), reason_(std::move(reason)), place_(std::move(place)),
          message_(in_words(*place_) + ": " + reason_) {}

    [[nodiscard]] Status status() const noexcept { return status_; }
    [[nodiscard]] const std::string& reason() const noexcept { return reason_; }
    [[nodiscard]] const std::optional<Place>& place() const noexcept { return place_; }
    [[nodiscard]] const std::string& message() const noexcept { return message_; }
    [[nodiscard]] const char* what() const noexcept override { return message_.c_str(); }

private:
    Status status_;
    std::string reason_;
    std::optional<Place> place_;
    std::string message_;
};

} // namespace rankstead
