// One call of a cell function: arguments as Calc hands them over in, what the cell shows out.
#ifndef RANKSTEAD_ADDIN_ANSWER_H
#define RANKSTEAD_ADDIN_ANSWER_H

#include <com/sun/star/uno/Any.hxx>
#include <com/sun/star/uno/Sequence.hxx>

#include <cstddef>

namespace rankstead::calc {

com::sun::star::uno::Any answer(std::size_t study,
                                const com::sun::star::uno::Sequence<com::sun::star::uno::Any>& arguments);

} // namespace rankstead::calc

#endif
