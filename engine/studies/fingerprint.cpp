#include "fingerprint.h"

namespace rankstead {

void Fingerprint::add_byte(unsigned char byte) {
    hash_ ^= byte;
    hash_ *= prime;
}

void Fingerprint::add_integer(std::uint64_t value) {
    for (unsigned shift = 0; shift < 64; shift += 8) {
        add_byte(static_cast<unsigned char>(value >> shift));
    }
}

Fingerprint& Fingerprint::add(const Decimal& value) {
    add_integer(static_cast<std::uint64_t>(value.coefficient));
    add_integer(static_cast<std::uint64_t>(value.exponent));
    return *this;
}

Fingerprint& Fingerprint::add(const Column& column) {
    add_integer(column.heading.size());
    for (const char c : column.heading) {
        add_byte(static_cast<unsigned char>(c));
    }
    add_integer(column.values.size());
    for (const Decimal& value : column.values) {
        add(value);
    }
    return *this;
}

std::string Fingerprint::text() const {
    constexpr char digits[] = "0123456789abcdef";
    std::string result;
    for (unsigned shift = 128; shift > 0; shift -= 4) {
        result += digits[static_cast<unsigned>(hash_ >> (shift - 4)) & 15U];
    }
    return result;
}

} // namespace rankstead
