// What the tests of the extension share: one office for each group of tests, one new document for each test.
#ifndef RANKSTEAD_TESTS_CALC_CALC_TEST_H
#define RANKSTEAD_TESTS_CALC_CALC_TEST_H

#include "office.h"

#include <com/sun/star/uno/Exception.hpp>
#include <gtest/gtest.h>

#include <memory>

namespace calc_tests {

class CalcTest : public testing::Test {
protected:
    static void SetUpTestSuite() { office = std::make_unique<Office>(); }
    static void TearDownTestSuite() { office.reset(); }

    Document document = office->new_document();

    static inline std::unique_ptr<Office> office;
};

// Eight rises of 1 to 8: differences 1, 2, ... 8 without ties, so that everything about them can be counted by hand.
// A1:A8 before, B1:B8 after.
inline void put_eight_rises(Document& document) {
    document.put_down("A1", {20.0, 20.0, 20.0, 20.0, 20.0, 20.0, 20.0, 20.0});
    document.put_down("B1", {21.0, 22.0, 23.0, 24.0, 25.0, 26.0, 27.0, 28.0});
}

// D1:D3 all lower than E1:E3.
inline void put_three_below_three(Document& document) {
    document.put_down("D1", {1.0, 2.0, 3.0});
    document.put_down("E1", {4.0, 5.0, 6.0});
}

inline testing::AssertionResult shows_error(const Shown& shown, CellError error) {
    if (shown == Shown(error))
        return testing::AssertionSuccess();
    return testing::AssertionFailure() << "shows " << in_words(shown);
}

inline testing::AssertionResult starts_with(const std::string& text, const std::string& start) {
    if (text.rfind(start, 0) == 0)
        return testing::AssertionSuccess();
    return testing::AssertionFailure() << '"' << text << "\" does not start with \"" << start << '"';
}

inline testing::AssertionResult has(const std::string& text, const std::string& part) {
    if (text.find(part) != std::string::npos)
        return testing::AssertionSuccess();
    return testing::AssertionFailure() << '"' << text << "\" does not contain \"" << part << '"';
}

} // namespace calc_tests

#endif
