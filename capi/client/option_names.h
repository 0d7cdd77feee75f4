// What the data and the settings of a study are called on the command line.
#pragma once

#include <string>
#include <vector>

namespace rankstead::client {

struct OptionName {
    std::string option; // "chance-interval"
    std::string word;   // "chance interval"
};

struct OptionNames {
    std::vector<OptionName> data, settings;
    bool long_layout; // whether --values, --labels and --id are the options of the long layout
};

// An argument or a setting has its own word as option. Where that is taken, by an option of the client or by an
// argument, it is --data-WORD or --setting-WORD. The long layout is for studies with several arguments, unless one of
// these has the name of an option of the layout: such a study takes its labels itself.
OptionNames option_names(const std::vector<std::string>& arguments, const std::vector<std::string>& settings);

} // namespace rankstead::client
