// Just enough XML to write configuration files: nested elements, attributes, escaped text.
#ifndef RANKSTEAD_ADDIN_XML_H
#define RANKSTEAD_ADDIN_XML_H

#include <ostream>
#include <string>
#include <utility>
#include <vector>

namespace xml {

using Attributes = std::vector<std::pair<std::string, std::string>>;

std::string escaped(const std::string& text);
std::string tag(const std::string& name, const Attributes& attributes, const char* end);

// Owns the indentation of one document.
class Writer {
public:
    explicit Writer(std::ostream& stream);
    void open(const std::string& name, const Attributes& attributes);
    void close(const std::string& name);
    void line(const std::string& markup);

private:
    std::ostream& out;
    std::size_t depth = 0;
};

// An element that is open as long as this lives.
class Element {
public:
    Element(Writer& writer, std::string element, const Attributes& attributes);
    ~Element();
    Element(const Element&) = delete;
    Element& operator=(const Element&) = delete;

private:
    Writer& out;
    std::string name;
};

void empty(Writer& out, const std::string& name, const Attributes& attributes);

enum class Language { none, english };

// One value of the office's configuration. Values that Calc localises carry a language.
void property(Writer& out, const std::string& name, const std::string& value, Language language);

} // namespace xml

#endif
