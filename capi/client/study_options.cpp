#include "study_options.h"

#include "words.h"

namespace rankstead::client {
namespace {

using cxxopts::value;

void add_output_options(cxxopts::Options& options, const Study& study) {
    cxxopts::OptionAdder add = options.add_options("Output");
    if (!study.helper) {
        add("answer", "Print this answer only, e.g. " + in_quotes(study.default_answer) + "; may be repeated",
            value<std::string>(), "WORD");
    }
    add("json", "Print one JSON object");
    add("help", "Print this help");
}

void add_data_options(cxxopts::Options& options, const Study& study, const OptionNames& names) {
    cxxopts::OptionAdder add = options.add_options("Data");
    for (std::size_t i = 0; i < names.data.size(); ++i) {
        add(names.data[i].option, "Column or number: " + study.arguments[i].help, value<std::string>(), "COLUMN");
    }
    add("separator", "What separates the cells of a row: one character, or the word tab (default: a comma)",
        value<std::string>(), "CHARACTER");
}

void add_layout_options(cxxopts::Options& options, const OptionNames& names) {
    if (!names.long_layout) {
        return;
    }
    cxxopts::OptionAdder add = options.add_options("Long layout");
    add("values", "Column with the values of all groups; the data options then take labels instead of columns",
        value<std::string>(), "COLUMN");
    add("labels", "Column with the label of each value", value<std::string>(), "COLUMN");
    add("id", "Column that says which values belong to the same subject", value<std::string>(), "COLUMN");
}

std::string setting_description(const Setting& setting) {
    const std::string values = setting.values.empty() ? "" : " (" + setting.values + ")";
    const std::string standard = setting.default_value.empty() ? "" : " [" + setting.default_value + "]";
    return setting.help + values + standard;
}

void add_setting_options(cxxopts::Options& options, const Study& study, const OptionNames& names) {
    cxxopts::OptionAdder add = options.add_options("Setting");
    const std::vector<Setting> settings = settings_of(study);
    for (std::size_t i = 0; i < names.settings.size(); ++i) {
        add(names.settings[i].option, setting_description(settings[i]), value<std::string>(), "VALUE");
    }
}

} // namespace

OptionNames option_names_of(const Study& study) {
    return option_names(words_of(study.arguments), words_of(settings_of(study)));
}

std::string synopsis(const Study& study, const OptionNames& names) {
    std::string result = hyphenated(study.word);
    if (!names.data.empty()) {
        result += " FILE";
    }
    for (const OptionName& name : names.data) {
        result += " --" + name.option + " COLUMN";
    }
    return result;
}

cxxopts::Options study_options(const Study& study, const OptionNames& names) {
    cxxopts::Options options("rankstead", study.help + '\n');
    options.custom_help(synopsis(study, names) + " [OPTION...]").set_width(100);
    if (!names.data.empty()) {
        add_data_options(options, study, names);
    }
    add_layout_options(options, names);
    add_setting_options(options, study, names);
    add_output_options(options, study);
    return options;
}

std::string study_help(const Study& study, const OptionNames& names) {
    constexpr const char* file_help =
        R"(FILE is a CSV file in UTF-8 with the headings of its columns in the first row; - is standard
input. Its numbers have a decimal point unless a setting says otherwise; its headings, or labels,
are the names of the groups unless these are given.

)";
    return study_options(study, names).help({"Data", "Long layout", "Setting", "Output"}) + '\n' +
           (names.data.empty() ? "" : file_help) + exit_status_help();
}

std::string help_command(const Study& study) {
    return "rankstead " + hyphenated(study.word) + " --help";
}

std::string exit_status_help() {
    return "Exit status: 0 done; 2 the command has to be changed; 3 the file has to be changed, or a number that was\n"
           "asked for does not exist; 1 any other failure. Messages go to standard error.\n";
}

} // namespace rankstead::client
