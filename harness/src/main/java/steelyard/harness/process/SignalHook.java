package steelyard.harness.process;

import java.lang.reflect.InvocationTargetException;
import java.lang.reflect.Method;
import java.lang.reflect.Proxy;
import java.util.Optional;

/**
 * Takes over one signal of this process.
 *
 * <p>The JDK offers this in {@code sun.misc}, which its module {@code jdk.unsupported} exports on
 * purpose (JEP 260), but the compiler warns of any mention of it and has no switch to be told
 * otherwise. So it is reached by name, and where it is missing or the signal is taken, the answer
 * is empty.
 */
final class SignalHook {
  private final Class<?> handlerType;
  private final Method handle;
  private final Object signal;

  private SignalHook(String name) throws ReflectiveOperationException {
    Class<?> signalType = Class.forName("sun.misc.Signal");
    handlerType = Class.forName("sun.misc.SignalHandler");
    handle = signalType.getMethod("handle", signalType, handlerType);
    signal = signalType.getConstructor(String.class).newInstance(name);
  }

  /**
   * Runs the reaction, on a thread of its own, each time the signal comes. A signal that this
   * process was started to ignore stays ignored.
   *
   * @param name without the prefix SIG
   * @return what puts the earlier state back
   */
  static Optional<Runnable> install(String name, Runnable reaction) {
    try {
      SignalHook hook = new SignalHook(name);
      Object earlier = hook.set(hook.handler(reaction));
      return Optional.of(() -> hook.restore(earlier));
    } catch (ReflectiveOperationException e) {
      return Optional.empty();
    }
  }

  private Object handler(Runnable reaction) {
    return Proxy.newProxyInstance(
        SignalHook.class.getClassLoader(),
        new Class<?>[] {handlerType},
        (proxy, method, arguments) -> {
          if (method.getDeclaringClass() == handlerType) {
            reaction.run();
            return null;
          }
          return method.invoke(reaction, arguments);
        });
  }

  private Object set(Object handler) throws IllegalAccessException, InvocationTargetException {
    return handle.invoke(null, signal, handler);
  }

  private void restore(Object earlier) {
    try {
      set(earlier);
    } catch (ReflectiveOperationException e) {
      throw new IllegalStateException("a signal that was taken cannot be given back", e);
    }
  }
}
