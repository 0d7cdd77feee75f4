#include "published.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>
#include <fstream>
#include <numbers>
#include <sstream>
#include <stdexcept>

namespace rks_test {

namespace {

nlohmann::json read_example(const std::string& id) {
    std::ifstream file(RANKSTEAD_REFERENCE_DIR "/published.json");
    for (const auto& example : nlohmann::json::parse(file))
        if (example.at("id") == id)
            return example;
    throw std::out_of_range("no published example " + id);
}

// Half a unit of the last printed digit, or the last bits of a double where a program printed all of them.
double printed_precision(const nlohmann::json& published) {
    const std::string digits = published.dump();
    const auto point = digits.find('.');
    const auto decimals = point == std::string::npos ? 0 : digits.size() - point - 1;
    return std::max(0.5000001 * std::pow(10.0, -static_cast<double>(decimals)), 1e-12 * published.get<double>());
}

} // namespace

Example::Example(const std::string& id) : example_(read_example(id)) {
    for (const auto& quantity : quantities())
        unused_.insert(quantity);
}

Example::~Example() {
    for (const auto& quantity : unused_)
        ADD_FAILURE() << "the check was not used: " << quantity;
}

std::vector<double> Example::data(const std::string& name) const {
    return example_.at("data").at(name).get<std::vector<double>>();
}

std::vector<double> Example::expanded(const std::string& counts, const std::vector<double>& levels) const {
    std::vector<double> values;
    const auto times = example_.at("data").at(counts).get<std::vector<std::size_t>>();
    for (std::size_t i = 0; i < times.size(); ++i)
        values.insert(values.end(), times[i], levels.at(i));
    return values;
}

std::vector<std::string> Example::quantities() const {
    std::vector<std::string> all;
    for (const auto& check : example_.at("checks"))
        all.push_back(check.at("quantity"));
    return all;
}

const nlohmann::json& Example::use(const std::string& quantity) {
    unused_.erase(quantity);
    for (const auto& check : example_.at("checks"))
        if (check.at("quantity") == quantity)
            return check;
    throw std::out_of_range("no check " + quantity);
}

void Example::expect(const std::string& quantity, double value, double relative) {
    const auto& check = use(quantity);
    const double recomputed = check.at("recomputed");
    EXPECT_NEAR(value, recomputed, relative * std::fabs(recomputed)) << quantity;
    if (check.at("published").is_number()) {
        EXPECT_NEAR(value, check.at("published").get<double>(), printed_precision(check.at("published"))) << quantity;
    }
}

void Example::expect_statement(const std::string& quantity, bool holds) {
    EXPECT_EQ(holds, use(quantity).at("recomputed").get<bool>()) << quantity;
}

std::vector<double> Example::recomputed_numbers(const std::string& quantity) {
    std::string text = use(quantity).at("recomputed");
    for (char& letter : text)
        if (letter == '(' || letter == ')' || letter == ',')
            letter = ' ';
    std::istringstream words(text);
    std::vector<double> numbers;
    for (double number = 0; words >> number;)
        numbers.push_back(number);
    return numbers;
}

void Example::not_an_answer(const std::string& quantity) {
    use(quantity);
}

double two_sided_normal(double z) {
    return std::erfc(std::fabs(z) / std::numbers::sqrt2);
}

} // namespace rks_test
