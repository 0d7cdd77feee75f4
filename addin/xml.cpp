#include "xml.h"

namespace xml {

std::string escaped(const std::string& text) {
    std::string result;
    for (char c : text) {
        switch (c) {
        case '&':
            result += "&amp;";
            break;
        case '<':
            result += "&lt;";
            break;
        case '>':
            result += "&gt;";
            break;
        case '"':
            result += "&quot;";
            break;
        default:
            result += c;
        }
    }
    return result;
}

std::string tag(const std::string& name, const Attributes& attributes, const char* end) {
    std::string markup = "<";
    markup += name;
    for (const auto& [attribute, value] : attributes)
        markup.append(" ").append(attribute).append("=\"").append(escaped(value)).append("\"");
    return markup += end;
}

Writer::Writer(std::ostream& stream) : out(stream) {
    line("<?xml version=\"1.0\" encoding=\"UTF-8\"?>");
}

void Writer::open(const std::string& name, const Attributes& attributes) {
    line(tag(name, attributes, ">"));
    ++depth;
}

void Writer::close(const std::string& name) {
    --depth;
    out << std::string(depth * 2, ' ') << "</" << name << ">\n";
}

void Writer::line(const std::string& markup) {
    out << std::string(depth * 2, ' ') << markup << '\n';
}

Element::Element(Writer& writer, std::string element, const Attributes& attributes)
    : out(writer), name(std::move(element)) {
    out.open(name, attributes);
}

Element::~Element() {
    out.close(name);
}

void empty(Writer& out, const std::string& name, const Attributes& attributes) {
    out.line(tag(name, attributes, "/>"));
}

void property(Writer& out, const std::string& name, const std::string& value, Language language) {
    std::string markup = tag("prop", {{"oor:name", name}}, ">");
    markup += language == Language::english ? "<value xml:lang=\"en\">" : "<value>";
    out.line(markup + escaped(value) + "</value></prop>");
}

} // namespace xml
