#include "utf8.h"

#include <algorithm>

namespace rankstead::client {
namespace {

struct Lead {
    std::size_t length;            // of the whole sequence; 0 where none can begin
    unsigned char lowest, highest; // the range of the second byte
};

// The table of well-formed byte sequences of RFC 3629, section 4.
Lead lead_of(unsigned char byte) noexcept {
    if (byte == 0x00) {
        return {0, 0, 0};
    }
    if (byte < 0x80) {
        return {1, 0, 0};
    }
    if (byte >= 0xC2 && byte <= 0xDF) {
        return {2, 0x80, 0xBF};
    }
    if (byte >= 0xE0 && byte <= 0xEF) {
        return {3, byte == 0xE0 ? static_cast<unsigned char>(0xA0) : static_cast<unsigned char>(0x80),
                byte == 0xED ? static_cast<unsigned char>(0x9F) : static_cast<unsigned char>(0xBF)};
    }
    if (byte >= 0xF0 && byte <= 0xF4) {
        return {4, byte == 0xF0 ? static_cast<unsigned char>(0x90) : static_cast<unsigned char>(0x80),
                byte == 0xF4 ? static_cast<unsigned char>(0x8F) : static_cast<unsigned char>(0xBF)};
    }
    return {0, 0, 0};
}

bool continues(char c) noexcept {
    return (static_cast<unsigned char>(c) & 0xC0U) == 0x80U;
}

// The length of the sequence at the start of `bytes`, 0 if it is not well formed.
std::size_t sequence_length(std::string_view bytes) noexcept {
    const Lead lead = lead_of(static_cast<unsigned char>(bytes[0]));
    if (lead.length <= 1 || bytes.size() < lead.length) {
        return lead.length == 1 ? 1 : 0;
    }
    const auto second = static_cast<unsigned char>(bytes[1]);
    const bool fits = second >= lead.lowest && second <= lead.highest;
    const std::string_view others = bytes.substr(2, lead.length - 2);
    return fits && std::all_of(others.begin(), others.end(), continues) ? lead.length : 0;
}

} // namespace

bool is_utf8_text(std::string_view bytes) noexcept {
    while (!bytes.empty()) {
        const std::size_t length = sequence_length(bytes);
        if (length == 0) {
            return false;
        }
        bytes.remove_prefix(length);
    }
    return true;
}

std::size_t character_count(std::string_view text) noexcept {
    return text.size() - static_cast<std::size_t>(std::count_if(text.begin(), text.end(), continues));
}

std::string_view without_byte_order_mark(std::string_view bytes) noexcept {
    constexpr std::string_view mark = "\xEF\xBB\xBF";
    return bytes.starts_with(mark) ? bytes.substr(mark.size()) : bytes;
}

} // namespace rankstead::client
