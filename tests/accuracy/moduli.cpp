#include "moduli.h"

#include <boost/integer/mod_inverse.hpp>

#include <algorithm>
#include <numeric>

namespace rankstead::accuracy {

namespace {

constexpr double bits_of_a_modulus = 62.999; // at least

Big inverse(const Big& number, const Big& modulus) {
    return boost::integer::mod_inverse(Big(number % modulus), modulus);
}

} // namespace

std::vector<std::uint64_t> coprime_moduli(double bits) {
    std::vector<std::uint64_t> moduli;
    for (std::uint64_t next = (std::uint64_t{1} << 63) - 1;
         moduli.empty() || bits_of_a_modulus * static_cast<double>(moduli.size()) <= bits; next -= 2) {
        const bool coprime = std::all_of(moduli.begin(), moduli.end(),
                                         [next](std::uint64_t modulus) { return std::gcd(next, modulus) == 1; });
        if (coprime) {
            moduli.push_back(next);
        }
    }
    return moduli;
}

Big integer_with(const std::vector<std::uint64_t>& remainders, const std::vector<std::uint64_t>& moduli) {
    Big value = 0;
    Big product = 1;
    for (std::size_t i = 0; i < moduli.size(); ++i) {
        const Big modulus = moduli[i];
        const Big missing = ((Big(remainders[i]) - value) % modulus + modulus) % modulus;
        value += product * (moduli.size() == 1 ? missing : Big(missing * inverse(product, modulus) % modulus));
        product *= modulus;
    }
    return value;
}

} // namespace rankstead::accuracy
