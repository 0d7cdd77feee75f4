// The component: one object that answers every cell function. Calc calls methods of an interface that is generated from
// the catalogue; an adapter of the office turns each call into invoke(name, arguments), so that no function needs code.
#include "answer.h"
#include "cell_error.h"
#include "convert.h"
#include "functions.h"

#include <rankstead.h>

#include <com/sun/star/beans/UnknownPropertyException.hpp>
#include <com/sun/star/lang/XServiceInfo.hpp>
#include <com/sun/star/lang/XTypeProvider.hpp>
#include <com/sun/star/script/InvocationAdapterFactory.hpp>
#include <com/sun/star/script/XInvocation.hpp>
#include <cppuhelper/implbase1.hxx>
#include <sal/types.h>

#include <map>

namespace rankstead::calc {
namespace {

namespace uno = com::sun::star::uno;
namespace lang = com::sun::star::lang;
namespace script = com::sun::star::script;
using rtl::OUString;

OUString wide(const std::string& text) {
    return utf16(text.data(), text.size());
}

uno::Sequence<uno::Type> types_offered() {
    const uno::Type types[] = {uno::Type(uno::TypeClass_INTERFACE, OUString(interface_full_name)),
                               cppu::UnoType<lang::XServiceInfo>::get(), cppu::UnoType<lang::XTypeProvider>::get()};
    return uno::Sequence<uno::Type>(types, 3);
}

class CellFunctions : public cppu::WeakImplHelper1<script::XInvocation> {
public:
    CellFunctions();

    uno::Reference<com::sun::star::beans::XIntrospectionAccess> SAL_CALL getIntrospection() override { return {}; }
    uno::Any SAL_CALL invoke(const OUString& name, const uno::Sequence<uno::Any>& arguments,
                             uno::Sequence<sal_Int16>& changed_positions, uno::Sequence<uno::Any>& changed) override;
    void SAL_CALL setValue(const OUString& name, const uno::Any& value) override;
    uno::Any SAL_CALL getValue(const OUString& name) override;
    sal_Bool SAL_CALL hasMethod(const OUString& name) override { return studies.count(name) > 0; }
    sal_Bool SAL_CALL hasProperty(const OUString&) override { return false; }

private:
    uno::Any about(const OUString& name, const uno::Sequence<uno::Any>& arguments) const;

    OUString service;
    std::map<OUString, std::size_t> studies; // by method
};

CellFunctions::CellFunctions() : service(wide(service_of(0))) {
    for (std::size_t study = 0; study < rks_study_count(); ++study)
        studies.emplace(wide(method_of(study)), study);
}

// Nothing may leave here but a value: an exception that the office does not expect could take it down.
uno::Any CellFunctions::invoke(const OUString& name, const uno::Sequence<uno::Any>& arguments,
                               uno::Sequence<sal_Int16>&, uno::Sequence<uno::Any>&) try {
    const auto found = studies.find(name);
    return found != studies.end() ? answer(found->second, arguments) : about(name, arguments);
} catch (...) {
    return error_cell(CellError::no_value);
}

// The adapter passes on the calls by which the office learns what this object is.
uno::Any CellFunctions::about(const OUString& name, const uno::Sequence<uno::Any>& arguments) const {
    if (name == "getTypes")
        return uno::Any(types_offered());
    if (name == "getImplementationId")
        return uno::Any(uno::Sequence<sal_Int8>());
    if (name == "getImplementationName")
        return uno::Any(OUString(implementation_name));
    if (name == "getSupportedServiceNames")
        return uno::Any(uno::Sequence<OUString>(&service, 1));
    if (name == "supportsService")
        return uno::Any(arguments.getLength() == 1 && arguments[0] == uno::Any(service));
    return {};
}

void CellFunctions::setValue(const OUString& name, const uno::Any&) {
    throw com::sun::star::beans::UnknownPropertyException(name, *this);
}

uno::Any CellFunctions::getValue(const OUString& name) {
    throw com::sun::star::beans::UnknownPropertyException(name, *this);
}

uno::Reference<uno::XInterface> adapted(const uno::Reference<uno::XComponentContext>& context) {
    const uno::Reference<script::XInvocation> functions(new CellFunctions);
    return script::InvocationAdapterFactory::create(context)->createAdapter(functions, types_offered());
}

} // namespace
} // namespace rankstead::calc

// Named in rankstead.components. Returns a reference that the caller releases, or null.
extern "C" SAL_DLLPUBLIC_EXPORT com::sun::star::uno::XInterface*
rankstead_cell_functions(com::sun::star::uno::XComponentContext* context,
                         const com::sun::star::uno::Sequence<com::sun::star::uno::Any>&) {
    try {
        com::sun::star::uno::Reference<com::sun::star::uno::XInterface> object = rankstead::calc::adapted(context);
        object->acquire();
        return object.get();
    } catch (...) {
        return nullptr;
    }
}
