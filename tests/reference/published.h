// The published examples of published.json, each check to be used once.
#ifndef RANKSTEAD_TESTS_REFERENCE_PUBLISHED_H
#define RANKSTEAD_TESTS_REFERENCE_PUBLISHED_H

#include <nlohmann/json.hpp>

#include <set>
#include <string>
#include <vector>

namespace rks_test {

class Example {
public:
    /// Reads the example with this id, e.g. "P01".
    explicit Example(const std::string& id);
    Example(const Example&) = delete;
    Example& operator=(const Example&) = delete;
    /// Fails the test if a check of the example was left unused.
    ~Example();

    std::vector<double> data(const std::string& name) const;
    /// A list of counts as that many values: {2, 1} with levels {5, 7} gives 5 5 7.
    std::vector<double> expanded(const std::string& counts, const std::vector<double>& levels) const;

    /// Expects `value` to equal the recomputed number closely and the published one to the digits it was printed with.
    void expect(const std::string& quantity, double value, double relative = 1e-12);
    /// Expects a statement of the source to hold as recomputed.
    void expect_statement(const std::string& quantity, bool holds);
    /// The numbers inside a recomputed text such as "(0.9, 2.7, 0.951)".
    std::vector<double> recomputed_numbers(const std::string& quantity);
    /// Sets aside a check of something that is no answer of any study.
    void not_an_answer(const std::string& quantity);
    /// All quantities of the example, in their order.
    std::vector<std::string> quantities() const;

private:
    const nlohmann::json& use(const std::string& quantity);

    nlohmann::json example_;
    std::set<std::string> unused_;
};

/// Two-sided p of a standard normal deviate.
double two_sided_normal(double z);

} // namespace rks_test

#endif
