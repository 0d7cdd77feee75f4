#include "document.h"

#include "text.h"

#include <com/sun/star/beans/PropertyValue.hpp>
#include <com/sun/star/beans/XPropertySet.hpp>
#include <com/sun/star/container/XIndexAccess.hpp>
#include <com/sun/star/frame/XStorable.hpp>
#include <com/sun/star/sheet/FormulaResult.hpp>
#include <com/sun/star/sheet/XArrayFormulaRange.hpp>
#include <com/sun/star/sheet/XCalculatable.hpp>
#include <com/sun/star/sheet/XCellRangeData.hpp>
#include <com/sun/star/sheet/XCellSeries.hpp>
#include <com/sun/star/table/CellContentType.hpp>
#include <com/sun/star/text/XText.hpp>
#include <com/sun/star/util/XCloseable.hpp>

#include <stdexcept>

namespace calc_tests {

namespace uno = com::sun::star::uno;
namespace sheet = com::sun::star::sheet;
namespace table = com::sun::star::table;
using uno::Reference;
using uno::UNO_QUERY_THROW;

namespace {

constexpr char free_cell[] = "AMJ1000";

// An empty text leaves the cell blank; nothing at all would make it #N/A.
uno::Any to_any(const Content& content) {
    if (const double* number = std::get_if<double>(&content))
        return uno::Any(*number);
    if (const std::string* text = std::get_if<std::string>(&content))
        return uno::Any(wide(*text));
    return uno::Any(rtl::OUString());
}

uno::Sequence<uno::Any> to_row(const std::vector<Content>& contents) {
    uno::Sequence<uno::Any> row(static_cast<sal_Int32>(contents.size()));
    for (std::size_t i = 0; i < contents.size(); ++i)
        row.getArray()[i] = to_any(contents[i]);
    return row;
}

// "B2" and 5 rows: "B2:B6".
std::string column_below(const std::string& first_cell, std::size_t rows) {
    const std::size_t digits = first_cell.find_first_of("0123456789", first_cell.rfind('.') + 1);
    const std::size_t sheet_end = first_cell.rfind('.') + 1;
    const std::size_t last = std::stoul(first_cell.substr(digits)) + rows - 1;
    return first_cell + ":" + first_cell.substr(sheet_end, digits - sheet_end) + std::to_string(last);
}

std::string text_of_cell(const Reference<table::XCell>& cell) {
    return narrow(Reference<com::sun::star::text::XText>(cell, UNO_QUERY_THROW)->getString());
}

bool shows_text(const Reference<table::XCell>& cell) {
    if (cell->getType() == table::CellContentType_TEXT)
        return true;
    sal_Int32 result = 0;
    Reference<com::sun::star::beans::XPropertySet>(cell, UNO_QUERY_THROW)->getPropertyValue("FormulaResultType2") >>=
        result;
    return cell->getType() == table::CellContentType_FORMULA && result == sheet::FormulaResult::STRING;
}

} // namespace

Document::Document(const Reference<com::sun::star::lang::XComponent>& component)
    : document(component, UNO_QUERY_THROW) {}

Document::~Document() {
    try {
        const Reference<com::sun::star::util::XCloseable> closeable(document, uno::UNO_QUERY);
        if (closeable.is())
            closeable->close(true);
    } catch (const uno::Exception&) { // the office is gone, and the document with it
    }
}

Reference<table::XCellRange> Document::range(const std::string& name) const {
    const std::size_t dot = name.find('.');
    const auto sheets = document->getSheets();
    const uno::Any found =
        dot == std::string::npos
            ? Reference<com::sun::star::container::XIndexAccess>(sheets, UNO_QUERY_THROW)->getByIndex(0)
            : sheets->getByName(wide(name.substr(0, dot)));
    const Reference<table::XCellRange> cells(found, UNO_QUERY_THROW);
    return cells->getCellRangeByName(wide(dot == std::string::npos ? name : name.substr(dot + 1)));
}

Reference<table::XCell> Document::cell(const std::string& name) const {
    return range(name)->getCellByPosition(0, 0);
}

void Document::add_sheet(const std::string& name) {
    document->getSheets()->insertNewByName(
        wide(name), static_cast<sal_Int16>(document->getSheets()->getElementNames().getLength()));
}

void Document::put(const std::string& name, const Content& content) {
    put_rows(name, {{content}});
}

void Document::put_down(const std::string& first_cell, const std::vector<Content>& column) {
    std::vector<std::vector<Content>> rows;
    for (const Content& content : column)
        rows.push_back({content});
    put_rows(column_below(first_cell, column.size()), rows);
}

void Document::put_rows(const std::string& name, const std::vector<std::vector<Content>>& rows) {
    uno::Sequence<uno::Sequence<uno::Any>> data(static_cast<sal_Int32>(rows.size()));
    for (std::size_t i = 0; i < rows.size(); ++i)
        data.getArray()[i] = to_row(rows[i]);
    Reference<sheet::XCellRangeData>(range(name), UNO_QUERY_THROW)->setDataArray(data);
}

void Document::formula(const std::string& name, const std::string& text) {
    cell(name)->setFormula(wide(text));
}

void Document::array_formula(const std::string& name, const std::string& text) {
    Reference<sheet::XArrayFormulaRange>(range(name), UNO_QUERY_THROW)->setArrayFormula(wide(text));
}

void Document::fill_down(const std::string& name) {
    Reference<sheet::XCellSeries>(range(name), UNO_QUERY_THROW)->fillAuto(sheet::FillDirection_TO_BOTTOM, 1);
}

void Document::fill_right(const std::string& name) {
    Reference<sheet::XCellSeries>(range(name), UNO_QUERY_THROW)->fillAuto(sheet::FillDirection_TO_RIGHT, 1);
}

Shown Document::shown(const std::string& name) const {
    const Reference<table::XCell> found = cell(name);
    if (found->getError() != 0)
        return static_cast<CellError>(found->getError());
    if (shows_text(found))
        return text_of_cell(found);
    return found->getValue();
}

double Document::number(const std::string& name) const {
    return expected_kind<double>(name, shown(name), "a number");
}

std::string Document::text(const std::string& name) const {
    return expected_kind<std::string>(name, shown(name), "a text");
}

std::string Document::formula_of(const std::string& name) const {
    return narrow(cell(name)->getFormula());
}

std::string Document::as_displayed(const std::string& name) const {
    return text_of_cell(cell(name));
}

Shown Document::result_of(const std::string& formula_text) {
    formula(free_cell, formula_text);
    return shown(free_cell);
}

double Document::number_of(const std::string& formula_text) {
    return expected_kind<double>(formula_text, result_of(formula_text), "a number");
}

std::string Document::text_of(const std::string& formula_text) {
    return expected_kind<std::string>(formula_text, result_of(formula_text), "a text");
}

void Document::recalculate_everything() {
    Reference<sheet::XCalculatable>(document, UNO_QUERY_THROW)->calculateAll();
}

void Document::calculate_automatically(bool on) {
    Reference<sheet::XCalculatable>(document, UNO_QUERY_THROW)->enableAutomaticCalculation(on);
}

void Document::save(const std::filesystem::path& file, const std::string& filter) {
    uno::Sequence<com::sun::star::beans::PropertyValue> options(1);
    options.getArray()[0].Name = "FilterName";
    options.getArray()[0].Value <<= wide(filter);
    Reference<com::sun::star::frame::XStorable>(document, UNO_QUERY_THROW)->storeToURL(wide(url_of(file)), options);
    if (!std::filesystem::exists(file))
        throw std::runtime_error("the office did not write " + file.string());
}

} // namespace calc_tests
