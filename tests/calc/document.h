// A spreadsheet document in the office under test.
#ifndef RANKSTEAD_TESTS_CALC_DOCUMENT_H
#define RANKSTEAD_TESTS_CALC_DOCUMENT_H

#include "shown.h"

#include <com/sun/star/lang/XComponent.hpp>
#include <com/sun/star/sheet/XSpreadsheetDocument.hpp>
#include <com/sun/star/table/XCell.hpp>
#include <com/sun/star/table/XCellRange.hpp>

#include <filesystem>
#include <string>
#include <variant>
#include <vector>

namespace calc_tests {

// What is put into a cell: nothing, a number or a text.
using Content = std::variant<std::monostate, double, std::string>;
inline constexpr std::monostate blank{};

// Cells and ranges are named as in a formula: "B2", "B2:C9", "Settings.A1".
class Document {
public:
    explicit Document(const com::sun::star::uno::Reference<com::sun::star::lang::XComponent>& component);
    ~Document();
    Document(Document&& other) noexcept = default;
    Document& operator=(Document&&) = delete;

    void add_sheet(const std::string& name);
    void put(const std::string& cell, const Content& content);
    void put_down(const std::string& first_cell, const std::vector<Content>& column);
    void put_rows(const std::string& range, const std::vector<std::vector<Content>>& rows);
    void formula(const std::string& cell, const std::string& text);
    void array_formula(const std::string& range, const std::string& text);
    void fill_down(const std::string& range);  // from its first row
    void fill_right(const std::string& range); // from its first column

    Shown shown(const std::string& cell) const;
    double number(const std::string& cell) const;    // throws if the cell shows no number
    std::string text(const std::string& cell) const; // throws if the cell shows no text
    std::string formula_of(const std::string& cell) const;
    std::string as_displayed(const std::string& cell) const;

    // Puts a formula into a cell far from any data and gives what it shows.
    Shown result_of(const std::string& formula_text);
    double number_of(const std::string& formula_text);
    std::string text_of(const std::string& formula_text);

    void recalculate_everything();
    void calculate_automatically(bool on);
    void save(const std::filesystem::path& file, const std::string& filter);

private:
    com::sun::star::uno::Reference<com::sun::star::table::XCellRange> range(const std::string& name) const;
    com::sun::star::uno::Reference<com::sun::star::table::XCell> cell(const std::string& name) const;

    com::sun::star::uno::Reference<com::sun::star::sheet::XSpreadsheetDocument> document;
};

} // namespace calc_tests

#endif
