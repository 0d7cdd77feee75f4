#include "aligned.h"

#include "utf8.h"

#include <algorithm>
#include <string_view>

namespace rankstead::client {
namespace {

constexpr std::size_t gap = 2;

// Takes the first words of `text` that fit into `width`, at least one.
std::string_view take_line(std::string_view& text, std::size_t width) {
    std::size_t end = std::min(text.find(' '), text.size());
    while (end < text.size()) {
        const std::size_t next = std::min(text.find(' ', end + 1), text.size());
        if (character_count(text.substr(0, next)) > width) {
            break;
        }
        end = next;
    }
    const std::string_view line = text.substr(0, end);
    text.remove_prefix(std::min(end + 1, text.size()));
    return line;
}

void print_line(const Line& line, std::size_t indent, std::size_t width, std::ostream& out) {
    out << line.first;
    std::string_view rest = line.second;
    std::size_t blanks = indent - character_count(line.first);
    while (!rest.empty()) {
        out << std::string(blanks, ' ') << take_line(rest, width);
        out << (rest.empty() ? "" : "\n");
        blanks = indent;
    }
    out << '\n';
}

} // namespace

void print_aligned(const std::vector<Line>& lines, std::size_t width, std::ostream& out) {
    std::size_t longest = 0;
    for (const Line& line : lines) {
        longest = std::max(longest, character_count(line.first));
    }
    const std::size_t indent = longest + gap;
    for (const Line& line : lines) {
        print_line(line, indent, width > indent + gap ? width - indent : width, out);
    }
}

} // namespace rankstead::client
