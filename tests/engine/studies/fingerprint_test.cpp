// studies/fingerprint.h: FNV-1a of 128 bits, and what it tells apart.
#include "studies/fingerprint.h"

#include <boost/multiprecision/cpp_int.hpp>

#include <gtest/gtest.h>

namespace rankstead {
namespace {

Column column(std::string heading, std::vector<Decimal> values) {
    return {std::move(heading), std::move(values), {}};
}

// Fowler, Noll & Vo, http://www.isthe.com/chongo/tech/comp/fnv/: offset basis and prime for 128 bits, in decimal.
boost::multiprecision::cpp_int fnv1a_128(const std::vector<unsigned>& bytes) {
    using Big = boost::multiprecision::cpp_int;
    Big hash("144066263297769815596495629667062367629");
    const Big prime("309485009821345068724781371");
    const Big modulus = Big(1) << 128;
    for (const unsigned byte : bytes) {
        hash = (hash ^ byte) * prime % modulus;
    }
    return hash;
}

std::string hexadecimal(const boost::multiprecision::cpp_int& value) {
    const std::string digits = value.str(0, std::ios_base::hex);
    std::string lower;
    for (const char c : digits) {
        lower += c >= 'A' && c <= 'F' ? static_cast<char>(c - 'A' + 'a') : c;
    }
    return std::string(32 - lower.size(), '0') + lower;
}

TEST(Fingerprint, of_nothing_is_the_offset_basis) {
    EXPECT_EQ(Fingerprint().text(), hexadecimal(fnv1a_128({})));
}

TEST(Fingerprint, is_fnv_1a_of_coefficient_and_exponent) {
    // 2.58 is 258 * 10^-2: two little-endian integers of 64 bits.
    EXPECT_EQ(Fingerprint().add(Decimal{258, -2}).text(),
              hexadecimal(fnv1a_128({2, 1, 0, 0, 0, 0, 0, 0, 254, 255, 255, 255, 255, 255, 255, 255})));
}

TEST(Fingerprint, is_the_same_for_the_same_data) {
    EXPECT_EQ(Fingerprint().add(column("h", {{1, 0}, {2, 0}})).text(),
              Fingerprint().add(column("h", {{1, 0}, {2, 0}})).text());
}

TEST(Fingerprint, depends_on_the_order_of_the_values) {
    EXPECT_NE(Fingerprint().add(column("", {{1, 0}, {2, 0}})).text(),
              Fingerprint().add(column("", {{2, 0}, {1, 0}})).text());
}

TEST(Fingerprint, depends_on_the_heading) {
    EXPECT_NE(Fingerprint().add(column("a", {{1, 0}})).text(), Fingerprint().add(column("b", {{1, 0}})).text());
}

TEST(Fingerprint, depends_on_where_one_column_ends) {
    EXPECT_NE(Fingerprint().add(column("", {{1, 0}, {2, 0}})).add(column("", {{3, 0}})).text(),
              Fingerprint().add(column("", {{1, 0}})).add(column("", {{2, 0}, {3, 0}})).text());
}

} // namespace
} // namespace rankstead
