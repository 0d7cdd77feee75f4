// A fingerprint of the data that were used: headings, values and their order (FNV-1a, 128 bits; Fowler, Noll & Vo).
#pragma once

#include "../intake.h"

#include <cstdint>
#include <string>

namespace rankstead {

class Fingerprint {
public:
    Fingerprint& add(const Column& column);
    Fingerprint& add(const Decimal& value);
    // 32 hexadecimal digits.
    [[nodiscard]] std::string text() const;

private:
    __extension__ typedef unsigned __int128 Hash;
    void add_byte(unsigned char byte);
    void add_integer(std::uint64_t value);

    static constexpr Hash offset_basis = (Hash{0x6C62272E07BB0142U} << 64U) | 0x62B821756295C58DU;
    static constexpr Hash prime = (Hash{0x0000000001000000U} << 64U) | 0x000000000000013BU;
    Hash hash_ = offset_basis;
};

} // namespace rankstead
