import { createApp } from 'vue';
import App from './App.vue';
import { installI18n } from './boot/i18n.ts';
import { installPinia } from './boot/pinia.ts';
import { installQuasar } from './boot/quasar.ts';
import { installRouter } from './boot/router.ts';
import './styles/index.scss';

const app = createApp(App);
installI18n(app);
installPinia(app);
installQuasar(app);
installRouter(app);
app.mount('#app');
