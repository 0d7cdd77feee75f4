#include "option_names.h"

#include "words.h"

#include <algorithm>
#include <set>

namespace rankstead::client {
namespace {

using Taken = std::set<std::string>;

const char* const client_options[] = {"answer", "json", "separator", "help", "version"};
const char* const layout_options[] = {"values", "labels", "id"};

bool has_layout_word(const std::vector<std::string>& arguments) {
    return std::any_of(arguments.begin(), arguments.end(), [](const std::string& word) {
        return std::find(std::begin(layout_options), std::end(layout_options), hyphenated(word)) !=
               std::end(layout_options);
    });
}

std::vector<OptionName> named(const std::vector<std::string>& words, const std::string& prefix, Taken& taken) {
    std::vector<OptionName> result;
    for (const std::string& word : words) {
        std::string option = hyphenated(word);
        while (!taken.insert(option).second) {
            option.insert(0, prefix);
        }
        result.push_back({option, word});
    }
    return result;
}

} // namespace

OptionNames option_names(const std::vector<std::string>& arguments, const std::vector<std::string>& settings) {
    OptionNames names{};
    names.long_layout = arguments.size() > 1 && !has_layout_word(arguments);
    Taken taken(std::begin(client_options), std::end(client_options));
    if (names.long_layout) {
        taken.insert(std::begin(layout_options), std::end(layout_options));
    }
    names.data = named(arguments, "data-", taken);
    names.settings = named(settings, "setting-", taken);
    return names;
}

} // namespace rankstead::client
