#include "inquiry.h"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>
#include <stdexcept>

namespace rks_test {

std::vector<rks_cell> column(const std::vector<std::optional<double>>& values) {
    std::vector<rks_cell> cells;
    for (const auto& value : values)
        cells.push_back(value ? number_cell(*value) : blank_cell());
    return cells;
}

Inquiry::Inquiry(const std::string& study) {
    rks_inquiry* opened = nullptr;
    const rks_status status = rks_inquiry_new(study.c_str(), &opened);
    handle_.reset(opened);
    if (status != RKS_OK)
        throw std::runtime_error("no study " + study);
}

rks_status Inquiry::numbers(const std::string& argument, std::vector<double> values) {
    const auto& lent = lent_numbers_.emplace_back(std::move(values));
    return rks_inquiry_numbers(handle(), argument.c_str(), lent.data(), lent.size(), 1);
}

rks_status Inquiry::cells(const std::string& argument, std::vector<rks_cell> cells, std::size_t columns) {
    const auto& lent = lent_cells_.emplace_back(std::move(cells));
    return rks_inquiry_cells(handle(), argument.c_str(), lent.data(), lent.size() / columns, columns);
}

rks_status Inquiry::set(const std::string& setting, const std::string& value) {
    return rks_inquiry_set(handle(), setting.c_str(), value.c_str());
}

rks_status Inquiry::status(const std::string& answer) const {
    double ignored = 0;
    return rks_inquiry_number(handle(), answer.c_str(), &ignored);
}

double Inquiry::number(const std::string& answer) const {
    double value = 0;
    rks_inquiry_number(handle(), answer.c_str(), &value);
    return value;
}

std::string Inquiry::text(const std::string& answer) const {
    const char* text = nullptr;
    std::size_t length = 0;
    rks_inquiry_text(handle(), answer.c_str(), &text, &length);
    return text == nullptr ? std::string() : std::string(text, length);
}

rks_status Inquiry::text_status(const std::string& answer) const {
    const char* text = nullptr;
    return rks_inquiry_text(handle(), answer.c_str(), &text, nullptr);
}

std::optional<Where> Inquiry::where() const {
    Where found;
    const char* argument = nullptr;
    const char* reason = nullptr;
    if (rks_inquiry_where(handle(), &argument, &found.row, &found.column, &reason) != RKS_OK)
        return std::nullopt;
    found.argument = argument;
    found.reason = reason;
    return found;
}

namespace {

void expect_ok(rks_status status, const Inquiry& inquiry) {
    EXPECT_EQ(status, RKS_OK) << inquiry.message();
}

Inquiry answered(Inquiry inquiry, const Settings& settings) {
    for (const auto& [name, value] : settings)
        expect_ok(inquiry.set(name, value), inquiry);
    expect_ok(inquiry.run(), inquiry);
    return inquiry;
}

} // namespace

Inquiry single(std::vector<double> values, double reference, const Settings& settings) {
    Inquiry inquiry("single");
    expect_ok(inquiry.numbers("values", std::move(values)), inquiry);
    expect_ok(inquiry.numbers("reference", {reference}), inquiry);
    return answered(std::move(inquiry), settings);
}

Inquiry pairs(std::vector<double> before, std::vector<double> after, const Settings& settings) {
    Inquiry inquiry("pairs");
    expect_ok(inquiry.numbers("before", std::move(before)), inquiry);
    expect_ok(inquiry.numbers("after", std::move(after)), inquiry);
    return answered(std::move(inquiry), settings);
}

Inquiry groups(std::vector<double> first, std::vector<double> second, const Settings& settings) {
    Inquiry inquiry("groups");
    expect_ok(inquiry.numbers("first", std::move(first)), inquiry);
    expect_ok(inquiry.numbers("second", std::move(second)), inquiry);
    return answered(std::move(inquiry), settings);
}

std::size_t study_index(std::string_view word) {
    for (std::size_t i = 0; i < rks_study_count(); ++i)
        if (rks_study_word(i) == word)
            return i;
    throw std::out_of_range("no such study");
}

std::size_t setting_index(std::string_view word) {
    for (std::size_t i = 0; i < rks_setting_count(); ++i)
        if (rks_setting_word(i) == word)
            return i;
    throw std::out_of_range("no such setting");
}

} // namespace rks_test
