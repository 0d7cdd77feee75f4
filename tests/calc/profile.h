// A profile of the office's own, so that no test touches the user's.
#ifndef RANKSTEAD_TESTS_CALC_PROFILE_H
#define RANKSTEAD_TESTS_CALC_PROFILE_H

#include <filesystem>
#include <string>

namespace calc_tests {

// `locale`: the language and country that decide how numbers are written, e.g. "de-DE".
void write_profile(const std::filesystem::path& profile, const std::filesystem::path& program_folder,
                   const std::string& locale);

} // namespace calc_tests

#endif
