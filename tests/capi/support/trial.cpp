#include "trial.h"

#include <utility>

namespace rks_test {

Inquiry Trial::ask(const std::string& margin) const {
    Settings all = settings;
    all.emplace_back("margin", margin);
    return study == "groups" ? groups(doubles(one), doubles(other), all) : pairs(doubles(one), doubles(other), all);
}

Trial random_trial(RandomData& random, const std::string& study) {
    static const std::vector<std::pair<std::string, double>> levels = {
        {"0.95", 0.05}, {"0.9", 0.1}, {"0.8", 0.2}, {"0.5", 0.5}, {"0.99", 0.01}};
    Trial trial;
    trial.study = study;
    const auto size = [&] { return static_cast<std::size_t>(random.between(1, study == "groups" ? 8 : 10)); };
    trial.one = random.tied(size());
    trial.other = random.tied(study == "groups" ? size() : trial.one.size());
    const auto& [level, alpha] = random.one_of(levels);
    trial.alpha = alpha;
    trial.settings = {{"level", level}, {"side", random.one_of(sides)}, {"method", "exact"}};
    return trial;
}

std::string describe(const Trial& trial) {
    std::string text = trial.study;
    for (const auto* values : {&trial.one, &trial.other}) {
        text += " |";
        for (const auto value : *values)
            text.append(" ").append(decimal_text(value, 10));
    }
    for (const auto& [name, value] : trial.settings)
        text.append("; ").append(name).append("=").append(value);
    return text;
}

} // namespace rks_test
