// Texts between the tests (UTF-8) and the office (UTF-16).
#ifndef RANKSTEAD_TESTS_CALC_TEXT_H
#define RANKSTEAD_TESTS_CALC_TEXT_H

#include <rtl/ustring.hxx>

#include <filesystem>
#include <string>

namespace calc_tests {

inline rtl::OUString wide(const std::string& text) {
    return {text.data(), static_cast<sal_Int32>(text.size()), RTL_TEXTENCODING_UTF8};
}

inline std::string narrow(const rtl::OUString& text) {
    const rtl::OString bytes = rtl::OUStringToOString(text, RTL_TEXTENCODING_UTF8);
    return {bytes.getStr(), static_cast<std::size_t>(bytes.getLength())};
}

inline std::string url_of(const std::filesystem::path& path) {
    return "file://" + path.string();
}

} // namespace calc_tests

#endif
