// A question put through the public C contract, for tests: owns the handle and the data it lends out.
#ifndef RANKSTEAD_TESTS_CAPI_SUPPORT_INQUIRY_H
#define RANKSTEAD_TESTS_CAPI_SUPPORT_INQUIRY_H

#include <rankstead.h>

#include <cstddef>
#include <list>
#include <memory>
#include <optional>
#include <string>
#include <string_view>
#include <utility>
#include <vector>

namespace rks_test {

/// A cell that owns nothing: the text must outlive it.
inline rks_cell blank_cell() {
    return {RKS_CELL_BLANK, 0, 0.0, nullptr, 0};
}
inline rks_cell number_cell(double value) {
    return {RKS_CELL_NUMBER, 0, value, nullptr, 0};
}
inline rks_cell text_cell(std::string_view text) {
    return {RKS_CELL_TEXT, 0, 0.0, text.data(), text.size()};
}

/// Numbers as a column of cells; no value is a blank.
std::vector<rks_cell> column(const std::vector<std::optional<double>>& values);

struct Where {
    std::string argument;
    std::size_t row = 0;
    std::size_t column = 0;
    std::string reason;
};

/// One inquiry. Data given to it are kept alive with it.
class Inquiry {
public:
    explicit Inquiry(const std::string& study);

    rks_inquiry* handle() const { return handle_.get(); }

    rks_status numbers(const std::string& argument, std::vector<double> values);
    rks_status cells(const std::string& argument, std::vector<rks_cell> cells, std::size_t columns = 1);
    rks_status set(const std::string& setting, const std::string& value);
    rks_status run() { return rks_inquiry_run(handle()); }

    /// The status of a number answer.
    rks_status status(const std::string& answer) const;
    /// The number, or NaN.
    double number(const std::string& answer) const;
    std::string text(const std::string& answer) const;
    rks_status text_status(const std::string& answer) const;
    std::string message() const { return rks_inquiry_message(handle()); }
    std::optional<Where> where() const;

private:
    struct Release {
        void operator()(rks_inquiry* inquiry) const { rks_inquiry_free(inquiry); }
    };
    std::unique_ptr<rks_inquiry, Release> handle_;
    std::list<std::vector<double>> lent_numbers_;
    std::list<std::vector<rks_cell>> lent_cells_;
};

using Settings = std::vector<std::pair<std::string, std::string>>;

/// Inquiries that are expected to succeed, ready for their answers.
Inquiry single(std::vector<double> values, double reference, const Settings& settings = {});
Inquiry pairs(std::vector<double> before, std::vector<double> after, const Settings& settings = {});
Inquiry groups(std::vector<double> first, std::vector<double> second, const Settings& settings = {});

/// The index of a study, an answer or a setting word in the catalogue.
std::size_t study_index(std::string_view word);
std::size_t setting_index(std::string_view word);

} // namespace rks_test

#endif
