// The function wizard: every function and every argument has a description, that of the catalogue.
#include "calc_test.h"

#include "text.h"

#include <com/sun/star/beans/PropertyValue.hpp>
#include <com/sun/star/container/XNameAccess.hpp>
#include <com/sun/star/sheet/FunctionArgument.hpp>
#include <com/sun/star/sheet/FunctionCategory.hpp>
#include <rankstead.h>

namespace calc_tests {
namespace {

namespace uno = com::sun::star::uno;
using Arguments = uno::Sequence<com::sun::star::sheet::FunctionArgument>;

class CalcWizard : public CalcTest {
protected:
    template <typename Value>
    Value described(const std::string& function, const std::string& property) {
        const uno::Reference<com::sun::star::container::XNameAccess> functions(
            office->service("com.sun.star.sheet.FunctionDescriptions"), uno::UNO_QUERY_THROW);
        uno::Sequence<com::sun::star::beans::PropertyValue> properties;
        functions->getByName(wide(function)) >>= properties;
        Value value{};
        for (const com::sun::star::beans::PropertyValue& candidate : std::as_const(properties))
            if (candidate.Name == wide(property))
                candidate.Value >>= value;
        return value;
    }

    static std::size_t expected_arguments(std::size_t study) {
        return rks_argument_count(study) + (rks_study_form(study) == RKS_FORM_STUDY ? 2 : 0);
    }
};

std::vector<std::string> answers_of(std::size_t study) {
    std::vector<std::string> words;
    for (std::size_t i = 0; i < rks_answer_count(); ++i)
        if (rks_answer_fits(i, study) != 0)
            words.emplace_back(rks_answer_word(i));
    return words;
}

std::vector<std::string> settings_of(std::size_t study) {
    std::vector<std::string> words;
    for (std::size_t i = 0; i < rks_setting_count(); ++i)
        if (rks_setting_fits(i, study) != 0)
            words.emplace_back(rks_setting_word(i));
    return words;
}

TEST_F(CalcWizard, EveryFunctionIsDescribed) {
    ASSERT_GE(rks_study_count(), 4U);
    for (std::size_t study = 0; study < rks_study_count(); ++study) {
        const std::string function = rks_study_function(study);
        const std::string help = narrow(described<rtl::OUString>(function, "Description"));
        EXPECT_FALSE(help.empty()) << function;
        EXPECT_EQ(help, rks_study_help(study));
        EXPECT_EQ(described<sal_Int32>(function, "Category"), com::sun::star::sheet::FunctionCategory::ADDIN);
    }
}

TEST_F(CalcWizard, EveryArgumentIsDescribed) {
    for (std::size_t study = 0; study < rks_study_count(); ++study) {
        const std::string function = rks_study_function(study);
        const Arguments arguments = described<Arguments>(function, "Arguments");
        ASSERT_EQ(static_cast<std::size_t>(arguments.getLength()), expected_arguments(study)) << function;
        for (std::size_t i = 0; i < rks_argument_count(study); ++i) {
            EXPECT_EQ(narrow(arguments[static_cast<sal_Int32>(i)].Name), rks_argument_word(study, i)) << function;
            EXPECT_EQ(narrow(arguments[static_cast<sal_Int32>(i)].Description), rks_argument_help(study, i));
            EXPECT_FALSE(arguments[static_cast<sal_Int32>(i)].Description.isEmpty()) << function << ' ' << i;
        }
    }
}

TEST_F(CalcWizard, AnswerAndSettingsListTheirWords) {
    for (std::size_t study = 0; study < rks_study_count(); ++study) {
        if (rks_study_form(study) != RKS_FORM_STUDY)
            continue;
        const Arguments arguments = described<Arguments>(rks_study_function(study), "Arguments");
        ASSERT_EQ(static_cast<std::size_t>(arguments.getLength()), expected_arguments(study));
        const auto& answer = arguments[arguments.getLength() - 2];
        const auto& settings = arguments[arguments.getLength() - 1];
        EXPECT_EQ(narrow(answer.Name), "answer");
        EXPECT_EQ(narrow(settings.Name), "settings");
        for (const std::string& word : answers_of(study))
            EXPECT_TRUE(has(narrow(answer.Description), word));
        for (const std::string& word : settings_of(study))
            EXPECT_TRUE(has(narrow(settings.Description), word));
    }
}

} // namespace
} // namespace calc_tests
