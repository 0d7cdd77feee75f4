#include "random_data.h"

#include <algorithm>
#include <iomanip>
#include <sstream>
#include <utility>

namespace rks_test {

std::int64_t RandomData::between(std::int64_t low, std::int64_t high) {
    return low + static_cast<std::int64_t>(source_() % static_cast<std::uint64_t>(high - low + 1));
}

Tenths RandomData::tied(std::size_t size) {
    const std::int64_t levels = one_of<std::int64_t>({2, 4, 8, 20});
    const std::int64_t step = one_of<std::int64_t>({1, 5, 10});
    const std::int64_t start = -between(0, levels);
    Tenths values(size);
    for (auto& value : values)
        value = step * (start + between(0, levels));
    return values;
}

Tenths RandomData::untied(std::size_t size) {
    Tenths values(size);
    for (std::size_t i = 0; i < size; ++i)
        values[i] = (between(0, 1) == 0 ? 1 : -1) * (std::int64_t{3} << (2 * i));
    shuffle(values);
    return values;
}

void RandomData::shuffle(Tenths& values) {
    for (std::size_t i = values.size(); i > 1; --i)
        std::swap(values[i - 1], values[static_cast<std::size_t>(between(0, static_cast<std::int64_t>(i) - 1))]);
}

std::vector<double> random_tenths(std::uint64_t seed, std::size_t size, std::int64_t levels, std::int64_t shift) {
    RandomData random(seed);
    std::vector<double> values(size);
    for (auto& value : values)
        value = static_cast<double>(random.between(0, levels) + shift) / 10;
    return values;
}

std::vector<double> doubles(const Tenths& tenths) {
    std::vector<double> values;
    for (const auto tenth : tenths)
        values.push_back(static_cast<double>(tenth) / 10);
    return values;
}

std::string decimal_text(std::int64_t units, std::int64_t per_one) {
    const std::int64_t thousandths = units * (1000 / per_one);
    const std::int64_t size = thousandths < 0 ? -thousandths : thousandths;
    std::ostringstream text;
    text << (thousandths < 0 ? "-" : "") << size / 1000 << '.' << std::setw(3) << std::setfill('0') << size % 1000;
    return text.str();
}

} // namespace rks_test
