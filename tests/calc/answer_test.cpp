// Calls as no formula makes them, but another program might.
#include "answer.h"
#include "functions.h"

#include <gtest/gtest.h>
#include <rankstead.h>
#include <rtl/ustring.hxx>

#include <initializer_list>

namespace rankstead::calc {
namespace {

using com::sun::star::uno::Any;
using com::sun::star::uno::Sequence;

Any called(std::size_t study, std::initializer_list<Any> arguments) {
    return answer(study, {arguments.begin(), static_cast<sal_Int32>(arguments.size())});
}

std::size_t study_named(const std::string& method) {
    for (std::size_t study = 0; study < rks_study_count(); ++study)
        if (method_of(study) == method)
            return study;
    ADD_FAILURE() << "no study " << method;
    return 0;
}

TEST(Answer, TooFewArgumentsAreArgumentsLeftOut) {
    const std::size_t pairs = study_named("pairs");
    EXPECT_EQ(called(pairs, {}), called(pairs, {Any(), Any(), Any(), Any()}));
    EXPECT_EQ(called(pairs, {Any(1.0), Any(2.0)}), called(pairs, {Any(1.0), Any(2.0), Any(), Any()}));
}

TEST(Answer, ArgumentsBeyondTheLastAreNotLookedAt) {
    const std::size_t build = study_named("build");
    EXPECT_EQ(called(build, {Any(1.0), Any(2.0)}), called(build, {}));
    EXPECT_EQ(called(build, {}).getValueTypeClass(), com::sun::star::uno::TypeClass_STRING);
}

TEST(Answer, NeverABoolean) {
    for (std::size_t study = 0; study < rks_study_count(); ++study)
        for (std::size_t i = 0; i < rks_answer_count(); ++i) {
            const Any word(rtl::OUString::createFromAscii(rks_answer_word(i)));
            const Any shown = called(study, {Any(1.0), Any(2.0), word});
            EXPECT_TRUE(shown.hasValue());
            EXPECT_NE(shown.getValueTypeClass(), com::sun::star::uno::TypeClass_BOOLEAN);
        }
}

TEST(Functions, NamesAreThoseOfTheCatalogue) {
    EXPECT_EQ(service_of(study_named("pairs")), "RKS");
    EXPECT_STREQ(rks_study_function(study_named("groups")), "RKS.GROUPS");
    EXPECT_EQ(parameters_of(study_named("pairs")).size(), rks_argument_count(study_named("pairs")) + 2);
    EXPECT_TRUE(parameters_of(study_named("build")).empty());
}

} // namespace
} // namespace rankstead::calc
