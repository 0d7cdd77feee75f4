// UTF-8 (RFC 3629) as far as the client needs it.
#pragma once

#include <cstddef>
#include <string_view>

namespace rankstead::client {

// No stray bytes, no overlong forms, no surrogates, nothing above U+10FFFF, and no zero byte.
bool is_utf8_text(std::string_view bytes) noexcept;

// The number of characters, for aligning columns.
std::size_t character_count(std::string_view text) noexcept;

// Without the byte order mark that spreadsheets write at the start of a file.
std::string_view without_byte_order_mark(std::string_view bytes) noexcept;

} // namespace rankstead::client
