// One random question, so that it can be asked again at other margins and shown when it fails.
#ifndef RANKSTEAD_TESTS_CAPI_SUPPORT_TRIAL_H
#define RANKSTEAD_TESTS_CAPI_SUPPORT_TRIAL_H

#include "inquiry.h"
#include "random_data.h"

#include <string>
#include <vector>

namespace rks_test {

inline const std::vector<std::string> sides = {"two-sided", "higher", "lower"};

struct Trial {
    std::string study; // pairs or groups
    Tenths one, other; // before and after, or first and second
    Settings settings;
    double alpha = 0; // 1 - level, as the decimal
    bool drops_zeros = false;

    Inquiry ask(const std::string& margin) const;
};

Trial random_trial(RandomData& random, const std::string& study);
std::string describe(const Trial& trial);

} // namespace rks_test

#endif
