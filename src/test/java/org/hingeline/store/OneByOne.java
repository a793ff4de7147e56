package org.hingeline.store;

import java.lang.reflect.InvocationHandler;
import java.lang.reflect.InvocationTargetException;
import java.lang.reflect.Method;
import java.lang.reflect.Proxy;
import java.util.function.Function;
import org.hingeline.monitor.Books;

/** Makes every call of a book a transaction of its own. */
final class OneByOne {
    private OneByOne() {}

    static Books books(Function<Function<Books, Object>, Object> transaction) {
        return proxy(
                Books.class,
                (self, whichBook, none) -> proxy(
                        whichBook.getReturnType(),
                        (book, method, args) ->
                                transaction.apply(books -> call(method, call(whichBook, books), args))));
    }

    private static <T> T proxy(Class<T> type, InvocationHandler handler) {
        return type.cast(Proxy.newProxyInstance(type.getClassLoader(), new Class<?>[] {type}, handler));
    }

    private static Object call(Method method, Object target, Object... args) {
        try {
            return method.invoke(target, args);
        } catch (InvocationTargetException e) {
            if (e.getCause() instanceof RuntimeException failure) {
                throw failure;
            }
            throw new IllegalStateException(e.getCause());
        } catch (IllegalAccessException e) {
            throw new IllegalStateException(e);
        }
    }
}
